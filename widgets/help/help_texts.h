#pragma once

#include <QMap>
#include <QString>
#include <QStringList>

namespace cornerwright {

/// The help that is compiled in: for each topic one short text with definition, formula and source,
/// as Markdown. The files of a language hold many topics, each below a line "# topic".
class HelpTexts {
  public:
    /// The texts in a language ("en", "de"); in English where the language has none.
    explicit HelpTexts(const QString& language);

    /// Empty where nothing is said of the topic.
    QString markdown(const QString& topic) const { return texts_.value(topic); }
    QStringList topics() const { return texts_.keys(); }

  private:
    void read(const QString& file);

    QMap<QString, QString> texts_;
};

} // namespace cornerwright
