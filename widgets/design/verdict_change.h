#pragma once

#include "core/requirements/verdict.h"

#include <QString>
#include <QStringList>

namespace cornerwright {

/// "2 of 9 unmet", "all met", "1 of 9 not determined".
QString verdictText(const Verdict& verdict);

/// What a change does to the ledger: "2 of 9 unmet → all met", then every requirement whose state
/// changes with its worst value before and after.
QStringList changesOf(const Verdict& before, const Verdict& after, bool hertz);

} // namespace cornerwright
