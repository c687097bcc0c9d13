#pragma once

#include <optional>
#include <stdexcept>
#include <string>

namespace cornerwright {

/// Where in the user's input something stood. Lines and columns count from 1; a column is a field
/// number in tables and a character in formulas and JSON.
struct InputPlace {
    std::string file;
    std::optional<int> line;
    std::optional<int> column;
};

/// The user's file or value is wrong. `what()` is one sentence for a person:
/// "FILE, line 14, column 3: expected a number, found minus three".
class InputError : public std::runtime_error {
  public:
    InputError(InputPlace place, std::string expected, std::string found);

    const InputPlace& place() const { return place_; }
    const std::string& expected() const { return expected_; }
    const std::string& found() const { return found_; }

    /// The same error, told of `file` (for a reader that did not know the name of its stream).
    InputError in_file(const std::string& file) const;

  private:
    InputPlace place_;
    std::string expected_;
    std::string found_;
};

/// A file could not be written; nothing half written was left behind. `what()` is one sentence.
class WriteError : public std::runtime_error {
  public:
    using std::runtime_error::runtime_error;
};

} // namespace cornerwright
