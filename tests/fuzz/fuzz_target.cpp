#include "tests/fuzz/fuzz_inputs.h"

#include <cstddef>
#include <cstdint>
#include <string_view>

// One program for each input; the build says which.
extern "C" int LLVMFuzzerTestOneInput(const std::uint8_t* data, std::size_t size) {
    using enum cornerwright::fuzzing::Input;
    cornerwright::fuzzing::feed(CORNERWRIGHT_FUZZ_INPUT,
                                {reinterpret_cast<const char*>(data), size});
    return 0;
}
