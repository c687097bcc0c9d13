#pragma once

#include <QFile>
#include <QObject>
#include <QString>

#include <cstdint>
#include <memory>
#include <vector>

namespace cornerwright {

class MainWindow;
struct Project;

/// Measures how long the window takes from a mouse, wheel or key event that changed the project to
/// the painted frame that shows its assessment, or that of a later project. Writes one line for
/// each such event: kind, milliseconds from the event's delivery, milliseconds from the moment the
/// window system stamped it (resolution 1 ms; empty where its clock is not the system's monotonic
/// one), and 1 where a later event overtook it before it was assessed.
class FrameTimes : public QObject {
    Q_OBJECT

  public:
    FrameTimes(MainWindow& window, const QString& file);

  protected:
    bool eventFilter(QObject* watched, QEvent* event) override;

  private:
    struct Input {
        QString kind;
        std::int64_t delivered_ns = 0;
        std::int64_t stamped_ms = 0;
    };
    struct Change {
        Input input;
        std::shared_ptr<const Project> project;
        bool overtaken = false;
    };

    void takeChange();
    void takeContent();
    bool panesAreUpToDate() const;
    void framePainted();

    MainWindow& window_;
    QFile file_;
    Input input_;                 ///< the last one delivered
    std::vector<Change> waiting_; ///< in the order of their events
    std::size_t answered_ = 0;    ///< so many of them from the front have their assessment
    bool frameIsDue_ = false;
};

} // namespace cornerwright
