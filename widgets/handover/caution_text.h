#pragma once

#include <QStringList>

namespace cornerwright {

/// The standing cautions in the user's language, one sentence each. The sentences are those of the
/// exported files; their translations stand in the context "cautions" of the catalogue.
QStringList cautionSentences();

} // namespace cornerwright
