#include "widgets/window/appearance.h"

#include "widgets/theme.h"

#include <QApplication>
#include <QStyleFactory>

namespace cornerwright {

void applyAppearance(Ground ground) {
    QApplication::setPalette(QPalette()); // the system's own again
    const Theme& system = Theme::of(QApplication::palette());
    const Theme& theme = ground == Ground::light  ? Theme::light()
                         : ground == Ground::dark ? Theme::dark()
                                                  : system;
    QApplication::setStyle(QStyleFactory::create(QStringLiteral("Fusion")));
    QApplication::setPalette(theme.palette());
}

} // namespace cornerwright
