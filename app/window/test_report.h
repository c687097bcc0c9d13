#pragma once

#include <QObject>
#include <QString>
#include <QTimer>

namespace cornerwright {

class MainWindow;

/// For end-to-end tests: after every change of what the window shows, writes a JSON file with the
/// figures of the ledger, the undo state, and where on the screen the parts stand that a test
/// clicks or drags. The file is replaced in one step, and carries a number that rises.
class TestReport : public QObject {
    Q_OBJECT

  public:
    TestReport(MainWindow& window, const QString& file);

  protected:
    bool eventFilter(QObject* watched, QEvent* event) override;

  private:
    void write();

    MainWindow& window_;
    QString file_;
    QTimer later_; ///< runs until the event loop has come to rest
    int number_ = 0;
};

} // namespace cornerwright
