#include "widgets/chain/chain_panel.h"
#include "widgets/chain/section_card.h"
#include "widgets/parts/quantity_field.h"
#include "widgets/window/file_flow.h"
#include "widgets/window/main_window.h"
#include "widgets/window/window_actions.h"

#include <QApplication>
#include <QTest>
#include <QTimer>

#include <chrono>
#include <cstdio>
#include <cstdlib>
#include <random>

// The real window with a hand that types values into the first card and saves now and then, without
// rest, until somebody kills the process. Each value is one more than the one before, and is told
// on standard output with its moment on the clock that all processes of the machine share:
//     edit VALUE NANOSECONDS

namespace {

using namespace cornerwright;

void tell(double value) {
    const auto now = std::chrono::steady_clock::now().time_since_epoch();
    std::printf(
        "edit %.17g %lld\n", value,
        static_cast<long long>(std::chrono::duration_cast<std::chrono::nanoseconds>(now).count()));
    std::fflush(stdout);
}

} // namespace

/// kill_victim PROJECT RECOVERY_FOLDER SETTINGS SEED
int main(int argc, char** argv) {
    QApplication application(argc, argv);
    if (argc != 5) {
        return EXIT_FAILURE;
    }
    MainWindow window({QString::fromLocal8Bit(argv[3]), QString::fromLocal8Bit(argv[2])});
    window.files().open(QString::fromLocal8Bit(argv[1]));
    window.show();
    std::mt19937 random(static_cast<unsigned>(std::atoi(argv[4])));
    std::uniform_int_distribution<int> pause(0, 40); // ms
    std::uniform_int_distribution<int> oneIn(0, 11);

    QuantityField* field = window.chain().cards().at(0)->fields().at(0);
    double value = 1.0;
    QTimer hand;
    QObject::connect(&hand, &QTimer::timeout, &window, [&] {
        value += 1.0;
        field->setFocus();
        field->selectAll();
        QTest::keyClicks(field, QString::number(value));
        QTest::keyClick(field, Qt::Key_Return);
        tell(value);
        if (oneIn(random) == 0) {
            window.actions().save->trigger();
        }
        hand.start(pause(random));
    });
    hand.setSingleShot(true);
    hand.start(0);
    return QApplication::exec();
}
