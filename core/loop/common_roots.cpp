#include "core/loop/common_roots.h"

#include <algorithm>

namespace cornerwright {

ComplexVector take_common_roots(RootForm& form, double distance) {
    ComplexVector common;
    for (std::size_t i = form.zeros.size(); i-- > 0;) {
        const auto pole =
            std::find_if(form.poles.begin(), form.poles.end(), [&](Complex candidate) {
                return std::abs(candidate - form.zeros[i]) <= distance;
            });
        if (pole == form.poles.end())
            continue;
        common.push_back(*pole);
        form.poles.erase(pole);
        form.zeros.erase(form.zeros.begin() + static_cast<std::ptrdiff_t>(i));
    }
    return common;
}

Complex residue_at(RootForm form, Complex pole) {
    const auto at = std::find(form.poles.begin(), form.poles.end(), pole);
    if (at == form.poles.end())
        return 0.0;
    form.poles.erase(at);
    return evaluate(form, pole);
}

} // namespace cornerwright
