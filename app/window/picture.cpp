#include "app/window/picture.h"

#include "widgets/window/main_window.h"

#include <QApplication>
#include <QElapsedTimer>
#include <QPixmap>

namespace cornerwright {

bool writePicture(MainWindow& window, const QSize& size, const QString& file) {
    constexpr qint64 longestWait = 60000; // ms
    constexpr int settlingPasses = 10;    // replots are queued, some after one another
    constexpr int passLength = 20;        // ms
    window.resize(size);
    window.show();
    QElapsedTimer clock;
    clock.start();
    while (window.live().runner().isBusy() && clock.elapsed() < longestWait) {
        QApplication::processEvents(QEventLoop::WaitForMoreEvents, passLength);
    }
    for (int i = 0; i < settlingPasses; ++i) {
        QApplication::processEvents(QEventLoop::AllEvents, passLength);
    }
    return window.grab().save(file);
}

} // namespace cornerwright
