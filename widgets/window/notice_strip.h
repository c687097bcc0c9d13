#pragma once

#include <QString>
#include <QWidget>

#include <functional>
#include <vector>

class QVBoxLayout;

namespace cornerwright {

/// A choice that a notice offers.
struct NoticeChoice {
    QString text;
    std::function<void()> take;
};

/// Messages and questions in place, below the bar, instead of dialogs. The newest stands on top;
/// each can be sent away.
class NoticeStrip : public QWidget {
    Q_OBJECT

  public:
    enum class Kind { information, problem, question };

    explicit NoticeStrip(QWidget* parent = nullptr);

    /// Shows a notice. One with the same `topic` (not empty) is replaced, so that the same trouble
    /// does not pile up. Taking a choice closes the notice first.
    void show(Kind kind, const QString& text, const QString& topic = {},
              const std::vector<NoticeChoice>& choices = {});
    void close(const QString& topic);
    bool isShowing(const QString& topic) const;
    /// The texts that stand, newest first.
    QStringList texts() const;

  private:
    class Notice;
    void remove(Notice* notice);

    QVBoxLayout* layout_;
    std::vector<Notice*> notices_;
};

} // namespace cornerwright
