#pragma once

#include <QString>

namespace cornerwright {

/// The project that a first start opens; empty if there is none where the program looks: beside the
/// installation, then in the source tree it was built from.
QString firstDemo();

} // namespace cornerwright
