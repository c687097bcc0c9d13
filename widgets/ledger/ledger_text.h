#pragma once

#include "core/requirements/verdict.h"

#include <QString>

namespace cornerwright {

/// How far the worst value stands from its nearer limit, in its own unit: "3.1° short", "1.9 dB",
/// "∞"; empty where it is not determined.
QString distanceText(const RequirementResult& result, bool hertz);

/// Where the worst value was found: "load 18 kg, realised, 17.9 Hz"; the reason where it is not
/// determined.
QString whereText(const RequirementResult& result, bool hertz);

/// "design" or "realised", in the user's language.
QString loopText(LoopName loop);

/// The verdict in one line: "2 of 9 unmet · worst: unit 7, phase margin, 3.1° short".
QString verdictText(const Verdict& verdict, bool hertz);

} // namespace cornerwright
