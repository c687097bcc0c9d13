#include <QApplication>
#include <QStandardPaths>
#include <gtest/gtest.h>

/// Window tests run off screen and keep their settings away from the user's.
int main(int argc, char** argv) {
    qputenv("QT_QPA_PLATFORM", "offscreen");
    QStandardPaths::setTestModeEnabled(true);
    QApplication application(argc, argv);
    testing::InitGoogleTest(&argc, argv);
    return RUN_ALL_TESTS();
}
