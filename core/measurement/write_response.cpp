#include "core/measurement/write_response.h"

#include "core/numerics/number_text.h"
#include "core/numerics/write_file.h"

#include <algorithm>
#include <numbers>

namespace cornerwright {

std::string response_table(const MeasuredResponse& response,
                           const std::vector<std::string>& remarks) {
    std::string text;
    for (std::string remark : remarks) {
        std::replace_if(
            remark.begin(), remark.end(), [](char c) { return c == '\n' || c == '\r'; }, ' ');
        text += "# " + remark + "\n";
    }
    if (response.averages > 0.0)
        text += "# averages: " + number_text(response.averages) + "\n";
    const bool coherence = !response.coherence.empty();
    text +=
        coherence ? "Frequency (Hz),Real,Imaginary,Coherence\n" : "Frequency (Hz),Real,Imaginary\n";
    for (std::size_t i = 0; i < response.w_rad_s.size(); ++i) {
        text += number_text(response.w_rad_s[i] / (2.0 * std::numbers::pi)) + "," +
                number_text(response.response[i].real()) + "," +
                number_text(response.response[i].imag());
        if (coherence)
            text += "," + number_text(response.coherence[i]);
        text += "\n";
    }
    return text;
}

void write_response(const MeasuredResponse& response, const std::filesystem::path& file,
                    const std::vector<std::string>& remarks) {
    write_file(file, response_table(response, remarks));
}

} // namespace cornerwright
