#include "widgets/design/design_wish.h"

#include <QCoreApplication>

#include <algorithm>
#include <cmath>

namespace cornerwright {

namespace {

constexpr double fallbackCrossover = 10.0; // rad/s, where no loop crosses 0 dB
constexpr double firstMarginDeg = 45.0;
constexpr double firstError = 0.05;
constexpr double firstRejectionPart = 0.1; // of the crossover
constexpr double firstResonancePart = 2.0;
constexpr double firstResonanceSpan = 100.0;
constexpr double firstRollOffPart = 10.0;
constexpr double firstAttenuationDb = -40.0;

const Requirement* requirementOn(const Project& project, Measure measure) {
    const auto found = std::ranges::find_if(project.requirements, [measure](const Requirement& r) {
        return r.measure == measure && (r.at_least || r.at_most);
    });
    return found == project.requirements.end() ? nullptr : &*found;
}

double highestCrossover(const Assessment* assessment) {
    double highest = 0.0;
    if (assessment != nullptr) {
        for (const CaseAssessment& one : assessment->cases) {
            const auto& crossovers = one.design.figures.frequency.crossovers_rad_s;
            if (!crossovers.empty()) {
                highest = std::max(highest, crossovers.front());
            }
        }
    }
    return highest > 0.0 ? highest : fallbackCrossover;
}

void takeRequirements(DesignWish& wish, const Project& project) {
    if (const Requirement* margin = requirementOn(project, Measure::phase_margin);
        margin != nullptr && margin->at_least) {
        wish.lift.phase_margin_deg = *margin->at_least;
    }
    if (const Requirement* error = requirementOn(project, Measure::steady_state_error);
        error != nullptr && error->at_most) {
        wish.hold.input = error->input;
        wish.hold.error = *error->at_most;
    } else if (const Requirement* rejection =
                   requirementOn(project, Measure::disturbance_rejection);
               rejection != nullptr && rejection->at_most) {
        wish.holdsRejection = wish.kind == DesignKind::hold_low_frequency;
    }
    if (const Requirement* rejection = requirementOn(project, Measure::disturbance_rejection);
        rejection != nullptr && rejection->at_most) {
        wish.rejectionDb = *rejection->at_most;
        wish.upToRadS = rejection->up_to_rad_s;
    }
    if (const Requirement* rollOff = requirementOn(project, Measure::roll_off);
        rollOff != nullptr && rollOff->at_most) {
        wish.rollOff.below_db = *rollOff->at_most;
        wish.rollOff.from_rad_s = rollOff->from_rad_s;
    }
}

WishField field(const QString& label, QuantityKind kind, std::function<double&(DesignWish&)> part) {
    return {label, kind, false,
            [part](const DesignWish& wish) -> std::optional<double> {
                DesignWish copy = wish;
                return part(copy);
            },
            [part](DesignWish& wish, std::optional<double> value) {
                part(wish) = value.value_or(part(wish));
            }};
}

} // namespace

QString nameOf(DesignKind kind) {
    switch (kind) {
    case DesignKind::lift_phase:
        return QCoreApplication::translate("DesignWish", "Lift phase");
    case DesignKind::hold_low_frequency:
        return QCoreApplication::translate("DesignWish", "Hold low frequency");
    case DesignKind::gain_for_error:
        return QCoreApplication::translate("DesignWish", "Gain for error");
    case DesignKind::quiet_resonance:
        return QCoreApplication::translate("DesignWish", "Quiet a resonance");
    case DesignKind::roll_off:
        break;
    }
    return QCoreApplication::translate("DesignWish", "Roll off");
}

DesignWish firstWish(DesignKind kind, const Project& project, const Assessment* assessment) {
    const double crossover = highestCrossover(assessment);
    DesignWish wish;
    wish.kind = kind;
    wish.lift.phase_margin_deg = firstMarginDeg;
    wish.hold.error = firstError;
    wish.upToRadS = firstRejectionPart * crossover;
    wish.resonance.from_rad_s = firstResonancePart * crossover;
    wish.resonance.to_rad_s = firstResonanceSpan * crossover;
    wish.rollOff = {firstRollOffPart * crossover, firstAttenuationDb, false};
    takeRequirements(wish, project);
    return wish;
}

SectionProposal proposalFor(const DesignWish& wish, const PlacementProblem& problem) {
    switch (wish.kind) {
    case DesignKind::lift_phase:
        return lift_phase(problem, wish.lift);
    case DesignKind::hold_low_frequency:
        return wish.holdsRejection ? hold_rejection(problem, wish.rejectionDb, wish.upToRadS,
                                                    wish.hold.phase_spent_deg)
                                   : hold_low_frequency(problem, wish.hold);
    case DesignKind::gain_for_error:
        return gain_for_error(problem, wish.hold.input, wish.hold.error);
    case DesignKind::quiet_resonance:
        return quiet_resonance(problem, wish.resonance);
    case DesignKind::roll_off:
        break;
    }
    return roll_off(problem, wish.rollOff);
}

std::vector<WishField> wishFieldsOf(const DesignWish& wish) {
    const WishField spend =
        field(QCoreApplication::translate("DesignWish", "phase spent at crossover"),
              QuantityKind::angle, [](DesignWish& w) -> double& { return w.hold.phase_spent_deg; });
    const WishField error =
        field(QCoreApplication::translate("DesignWish", "largest error"), QuantityKind::plain,
              [](DesignWish& w) -> double& { return w.hold.error; });
    switch (wish.kind) {
    case DesignKind::lift_phase:
        return {
            field(QCoreApplication::translate("DesignWish", "wanted phase margin"),
                  QuantityKind::angle,
                  [](DesignWish& w) -> double& { return w.lift.phase_margin_deg; }),
            field(QCoreApplication::translate("DesignWish", "allowance"), QuantityKind::angle,
                  [](DesignWish& w) -> double& { return w.lift.allowance_deg; }),
            {QCoreApplication::translate("DesignWish", "crossover (empty: gain stays)"),
             QuantityKind::frequency, true,
             [](const DesignWish& w) { return w.lift.crossover_rad_s; },
             [](DesignWish& w, std::optional<double> value) { w.lift.crossover_rad_s = value; }}};
    case DesignKind::hold_low_frequency:
        if (!wish.holdsRejection) {
            return {error, spend};
        }
        return {field(QCoreApplication::translate("DesignWish", "rejection"), QuantityKind::decibel,
                      [](DesignWish& w) -> double& { return w.rejectionDb; }),
                field(QCoreApplication::translate("DesignWish", "up to"), QuantityKind::frequency,
                      [](DesignWish& w) -> double& { return w.upToRadS; }),
                spend};
    case DesignKind::gain_for_error:
        return {error};
    case DesignKind::quiet_resonance:
        return {field(QCoreApplication::translate("DesignWish", "looked for from"),
                      QuantityKind::frequency,
                      [](DesignWish& w) -> double& { return w.resonance.from_rad_s; }),
                field(QCoreApplication::translate("DesignWish", "up to"), QuantityKind::frequency,
                      [](DesignWish& w) -> double& { return w.resonance.to_rad_s; }),
                field(QCoreApplication::translate("DesignWish", "loop at every peak below"),
                      QuantityKind::decibel,
                      [](DesignWish& w) -> double& { return w.resonance.below_db; })};
    case DesignKind::roll_off:
        break;
    }
    return {field(QCoreApplication::translate("DesignWish", "from"), QuantityKind::frequency,
                  [](DesignWish& w) -> double& { return w.rollOff.from_rad_s; }),
            field(QCoreApplication::translate("DesignWish", "closed loop below"),
                  QuantityKind::decibel,
                  [](DesignWish& w) -> double& { return w.rollOff.below_db; })};
}

std::vector<WishChoice> wishChoicesOf(const DesignWish& wish) {
    const QStringList inputs{QCoreApplication::translate("DesignWish", "error after a step"),
                             QCoreApplication::translate("DesignWish", "error on a ramp"),
                             QCoreApplication::translate("DesignWish", "error on a parabola")};
    switch (wish.kind) {
    case DesignKind::hold_low_frequency: {
        constexpr int rejection = 3;
        return {{QCoreApplication::translate("DesignWish", "for"),
                 inputs + QStringList{QCoreApplication::translate("DesignWish",
                                                                  "disturbance rejection")},
                 [](const DesignWish& w) {
                     return w.holdsRejection ? rejection : static_cast<int>(w.hold.input);
                 },
                 [](DesignWish& w, int index) {
                     w.holdsRejection = index == rejection;
                     if (index < rejection) {
                         w.hold.input = static_cast<ErrorInput>(index);
                     }
                 }}};
    }
    case DesignKind::gain_for_error:
        return {{QCoreApplication::translate("DesignWish", "for"), inputs,
                 [](const DesignWish& w) { return static_cast<int>(w.hold.input); },
                 [](DesignWish& w, int index) { w.hold.input = static_cast<ErrorInput>(index); }}};
    case DesignKind::roll_off:
        return {{QCoreApplication::translate("DesignWish", "with"),
                 {QCoreApplication::translate("DesignWish", "one real pole"),
                  QCoreApplication::translate("DesignWish", "a pair, damping 0.7")},
                 [](const DesignWish& w) { return w.rollOff.complex_poles ? 1 : 0; },
                 [](DesignWish& w, int index) { w.rollOff.complex_poles = index == 1; }}};
    case DesignKind::lift_phase:
    case DesignKind::quiet_resonance:
        break;
    }
    return {};
}

} // namespace cornerwright
