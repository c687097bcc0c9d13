#pragma once

#include "core/requirements/requirement.h"

#include <QColor>
#include <QFont>
#include <QPalette>

#include <array>
#include <cstddef>

namespace cornerwright {

/// What a colour says. Nothing in the window or in an exported picture takes a colour from
/// elsewhere.
enum class ColourRole {
    paper,    ///< ground of the window
    pane,     ///< ground of panes, cards and tables
    hairline, ///< borders
    grid,     ///< grid lines
    ink,      ///< text, design and realised loop
    muted,    ///< secondary text
    graphite, ///< plant
    accent,   ///< the one accent: closed-loop poles, buttons, selection
    met,
    unmet,
};
inline constexpr std::size_t colour_role_count = 10;

/// The colours and fonts of one ground, light or dark.
class Theme {
  public:
    static const Theme& light();
    static const Theme& dark();
    /// The theme whose ground is nearer to the window colour of the palette.
    static const Theme& of(const QPalette& palette);

    bool isDark() const { return dark_; }
    QColor colour(ColourRole role) const { return colours_[static_cast<std::size_t>(role)]; }

    /// The colour of the section at `index` of the chain, on its card and on every pane. Seven
    /// colours come round again.
    QColor section(std::size_t index) const;
    /// The same hue with at least 4.5 : 1 against the pane, for text.
    QColor sectionText(std::size_t index) const;

    /// met, unmet, or muted for "not determined".
    QColor state(State state) const;

    /// `share` (0 to 1) of the role's colour over the pane ground, opaque: faint curves and fills.
    QColor faint(ColourRole role, double share) const;

    /// The widget palette with these roles.
    QPalette palette() const;

  private:
    Theme(bool dark, const std::array<QRgb, colour_role_count>& roles,
          const std::array<QRgb, 7>& sections);

    bool dark_;
    std::array<QColor, colour_role_count> colours_;
    std::array<QColor, 7> sections_;
    std::array<QColor, 7> sectionTexts_;
};

/// Contrast of two opaque colours, 1 to 21. Source: W3C Web Content Accessibility Guidelines 2.1,
/// definitions "relative luminance" and "contrast ratio".
double contrastOf(const QColor& first, const QColor& second);

/// `colour`, darkened or lightened in small steps away from `ground` until the contrast is reached.
QColor withContrast(QColor colour, const QColor& ground, double contrast);

/// "✓", "✗" or "?": a state is never told by colour alone.
QString markOf(State state);

enum class FontRole {
    body,  ///< the application's font
    small, ///< axes and notes
    strong ///< heads and handles' names
};

/// A font of the role, following the application's font and so the user's scale.
QFont fontOf(FontRole role);

} // namespace cornerwright
