#pragma once

#include <string>

namespace cornerwright {

/// One figure of the contract: a finite value, plus or minus infinity, or "not determined" with the
/// reason. There is no NaN: whoever cannot compute a figure says why.
class Figure {
  public:
    enum class Kind { undetermined, value, infinite, minus_infinite };

    Figure() = default;

    /// A finite value; plus or minus infinity become their own kinds; a NaN becomes undetermined.
    static Figure of(double value);
    static Figure infinite();
    static Figure minus_infinite();
    static Figure undetermined(std::string reason);

    Kind kind() const { return kind_; }
    bool is_value() const { return kind_ == Kind::value; }
    bool is_determined() const { return kind_ != Kind::undetermined; }

    /// The finite value, or +-HUGE_VAL for the infinite kinds. Not to be called when undetermined.
    double value() const;

    /// Why the figure is not determined; empty otherwise.
    const std::string& reason() const { return reason_; }

    /// A remark on a determined figure, such as "from the fit, misfit 0.4 dB"; empty if none.
    const std::string& note() const { return note_; }
    Figure with_note(std::string note) const;

    /// One standard deviation in the unit of the figure, from the random error of a measurement;
    /// 0 where none is known.
    double standard_deviation() const { return standard_deviation_; }
    Figure with_standard_deviation(double deviation) const;

    bool operator==(const Figure&) const = default;

  private:
    Kind kind_ = Kind::undetermined;
    double value_ = 0.0;
    double standard_deviation_ = 0.0;
    std::string reason_;
    std::string note_;
};

} // namespace cornerwright
