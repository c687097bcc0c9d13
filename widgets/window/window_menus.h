#pragma once

class QMenuBar;

namespace cornerwright {

class MainWindow;

/// Fills the menu bar of the window: every command, with its shortcut.
void fillMenus(MainWindow& window);

} // namespace cornerwright
