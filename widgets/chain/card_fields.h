#pragma once

#include "core/compensator/section.h"
#include "widgets/parts/quantity.h"

#include <QString>

#include <functional>
#include <vector>

namespace cornerwright {

/// One line of a section card: a number that can be typed, in the terms in which people think of
/// the section (a notch has a depth, not a zero damping).
struct CardField {
    QString label;
    QuantityKind kind = QuantityKind::plain;
    std::function<double(const Section&)> read;
    std::function<void(Section&, double)> write;
};

/// The fields of a kind, in the order of its card.
std::vector<CardField> cardFieldsOf(SectionKind kind);

/// What follows from the numbers: "ratio 8.7 · lifts 52° at 17.8 Hz" for a lead. Empty where there
/// is nothing to add.
QString factOf(const Section& section, bool hertz);

/// Why the section's numbers do not go together, in one sentence; empty where they do.
QString problemOf(const Section& section);

} // namespace cornerwright
