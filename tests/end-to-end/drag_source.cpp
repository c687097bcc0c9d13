// A window from which files can be dragged with the mouse, as from a file manager: the far end of a
// real drop. `drag_source FILE ...` stands in the lower left corner of the screen.

#include <QApplication>
#include <QDrag>
#include <QFileInfo>
#include <QMimeData>
#include <QMouseEvent>
#include <QScreen>
#include <QTimer>
#include <QUrl>
#include <QWidget>

#include <chrono>

namespace {

constexpr int side = 80;
constexpr std::chrono::seconds timeToFetch{5};

class Source : public QWidget {
  public:
    explicit Source(const QStringList& files) {
        for (const QString& file : files) {
            urls_ << QUrl::fromLocalFile(QFileInfo(file).absoluteFilePath());
        }
        setWindowFlags(Qt::FramelessWindowHint | Qt::WindowStaysOnTopHint);
        const QRect screen = QApplication::primaryScreen()->geometry();
        setGeometry(screen.left(), screen.bottom() - side + 1, side, side);
    }

  protected:
    void mouseMoveEvent(QMouseEvent* event) override {
        if ((event->buttons() & Qt::LeftButton) == 0) {
            return;
        }
        auto* dragged = new QMimeData; // taken over by the drag
        dragged->setUrls(urls_);
        auto* drag = new QDrag(this);
        drag->setMimeData(dragged);
        drag->exec(Qt::CopyAction);
        // The other side fetches the data after the drop.
        QTimer::singleShot(timeToFetch, &QApplication::quit);
    }

  private:
    QList<QUrl> urls_;
};

} // namespace

int main(int argc, char** argv) {
    QApplication application(argc, argv);
    Source source(QApplication::arguments().mid(1));
    source.show();
    return QApplication::exec();
}
