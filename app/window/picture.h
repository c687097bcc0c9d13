#pragma once

#include <QSize>
#include <QString>

namespace cornerwright {

class MainWindow;

/// Shows the window off screen in the wished size, waits until the project is assessed and painted,
/// and writes it to a PNG file. False where the file could not be written.
bool writePicture(MainWindow& window, const QSize& size, const QString& file);

} // namespace cornerwright
