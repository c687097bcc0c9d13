#pragma once

#include "core/handover/handover.h"

namespace cornerwright {

/// The forms of a handover, each from an input that has a difference equation and a usable name.
std::vector<HandoverFile> c99_files(const HandoverInput& input);
std::vector<HandoverFile> structured_text_files(const HandoverInput& input);
std::string json_text(const HandoverInput& input);
std::string csv_text(const HandoverInput& input);

} // namespace cornerwright
