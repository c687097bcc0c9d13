#pragma once

#include "core/engine/assessment.h"
#include "core/placement/section_design.h"
#include "core/project/project.h"
#include "widgets/parts/quantity.h"

#include <QString>
#include <QStringList>

#include <functional>
#include <optional>
#include <vector>

namespace cornerwright {

/// The section designs that can be asked for on the chain.
enum class DesignKind {
    lift_phase,
    hold_low_frequency,
    gain_for_error,
    quiet_resonance,
    roll_off,
};
inline constexpr int design_kind_count = 5;

/// What a person asks of a section design; which parts count depends on the kind.
struct DesignWish {
    DesignKind kind = DesignKind::lift_phase;
    PhaseLift lift;
    LowFrequencyHold hold;
    bool holdsRejection = false; ///< hold low frequency: for a rejection in place of an error
    double rejectionDb = -20.0;
    double upToRadS = 1.0;
    ResonanceQuieting resonance;
    RollOff rollOff;
};

/// "Lift phase".
QString nameOf(DesignKind kind);

/// What is asked first: limits from the requirements where there is one of the kind, frequencies
/// from the crossovers of the assessment (which may be null).
DesignWish firstWish(DesignKind kind, const Project& project, const Assessment* assessment);

/// Works the design out.
SectionProposal proposalFor(const DesignWish& wish, const PlacementProblem& problem);

/// A number of the wish that can be typed.
struct WishField {
    QString label;
    QuantityKind kind = QuantityKind::plain;
    bool mayBeEmpty = false;
    std::function<std::optional<double>(const DesignWish&)> read;
    std::function<void(DesignWish&, std::optional<double>)> write;
};

/// A choice among few.
struct WishChoice {
    QString label;
    QStringList options;
    std::function<int(const DesignWish&)> read;
    std::function<void(DesignWish&, int)> write;
};

/// What the panel asks for this wish, in order.
std::vector<WishField> wishFieldsOf(const DesignWish& wish);
std::vector<WishChoice> wishChoicesOf(const DesignWish& wish);

} // namespace cornerwright
