#include "core/compensator/chain.h"

namespace cornerwright {

RootForm roots_of(const Chain& chain) {
    RootForm product;
    for (const Section& section : chain) {
        if (section.enabled)
            product = product * roots_of(section);
    }
    return product;
}

} // namespace cornerwright
