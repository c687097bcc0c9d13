#include "widgets/handover/caution_text.h"

#include "core/handover/cautions.h"

#include <QCoreApplication>

namespace cornerwright {

QStringList cautionSentences() {
    QStringList sentences;
    for (const std::string& sentence : cautions()) {
        sentences << QCoreApplication::translate("cautions", sentence.c_str());
    }
    return sentences;
}

} // namespace cornerwright
