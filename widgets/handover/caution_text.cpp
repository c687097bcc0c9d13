#include "widgets/handover/caution_text.h"

#include "core/handover/cautions.h"

#include <QCoreApplication>

namespace cornerwright {

// The sentences of the core, word for word, so that they stand in the catalogues of the languages;
// nothing else uses the list.
[[maybe_unused]] constexpr const char* sentencesForTheCatalogues[] = {
    QT_TRANSLATE_NOOP(
        "cautions",
        "Closing a loop on real equipment can move, heat or energise it without warning."),
    QT_TRANSLATE_NOOP(
        "cautions",
        "First close it with limited effort, an independent stop, and nobody in reach."),
    QT_TRANSLATE_NOOP(
        "cautions",
        "These figures rest on the plant data given and say nothing of saturation, faults or what "
        "was not measured."),
    QT_TRANSLATE_NOOP("cautions",
                      "Local codes, the machine's risk assessment and licensed practice decide."),
};

QStringList cautionSentences() {
    QStringList sentences;
    for (const std::string& sentence : cautions()) {
        sentences << QCoreApplication::translate("cautions", sentence.c_str());
    }
    return sentences;
}

} // namespace cornerwright
