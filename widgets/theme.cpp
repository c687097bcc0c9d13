#include "widgets/theme.h"

#include <QApplication>

#include <algorithm>
#include <cmath>

namespace cornerwright {

namespace {

// Rows in the order of ColourRole.
constexpr std::array<QRgb, colour_role_count> light_roles{
    0xFFF4F3EF, // paper
    0xFFFFFFFF, // pane
    0xFFDEDBD3, // hairline
    0xFFEBE9E3, // grid
    0xFF1F2328, // ink
    0xFF6B6F76, // muted
    0xFF8A8F98, // graphite
    0xFF0F766E, // accent
    0xFF00785A, // met
    0xFFC2410C, // unmet
};
// Everything that can be text stands at 4.5 : 1 or more against pane and paper.
constexpr std::array<QRgb, colour_role_count> dark_roles{
    0xFF17191C, // paper
    0xFF1E2125, // pane
    0xFF3A3E45, // hairline
    0xFF2B2F35, // grid
    0xFFECEBE6, // ink
    0xFFA3A8B0, // muted
    0xFF8C929B, // graphite
    0xFF2DB5A8, // accent
    0xFF34B88F, // met
    0xFFF5854D, // unmet
};

// Okabe and Ito, Color Universal Design (2008): orange, sky, bluish green, yellow, blue, vermilion,
// reddish purple. Yellow is darkened on a light ground, blue lightened on a dark one.
constexpr std::array<QRgb, 7> light_sections{0xFFE69F00, 0xFF56B4E9, 0xFF009E73, 0xFFB5A800,
                                             0xFF0072B2, 0xFFD55E00, 0xFFCC79A7};
constexpr std::array<QRgb, 7> dark_sections{0xFFE69F00, 0xFF56B4E9, 0xFF009E73, 0xFFF0E442,
                                            0xFF3D94D1, 0xFFD55E00, 0xFFCC79A7};

constexpr double text_contrast = 4.5;

double linearChannel(double c) {
    return c <= 0.04045 ? c / 12.92 : std::pow((c + 0.055) / 1.055, 2.4);
}

double luminanceOf(const QColor& colour) {
    return 0.2126 * linearChannel(colour.redF()) + 0.7152 * linearChannel(colour.greenF()) +
           0.0722 * linearChannel(colour.blueF());
}

int mixedChannel(int over, int ground, double share) {
    return static_cast<int>(std::lround(share * over + (1.0 - share) * ground));
}

} // namespace

Theme::Theme(bool dark, const std::array<QRgb, colour_role_count>& roles,
             const std::array<QRgb, 7>& sections)
    : dark_(dark) {
    std::transform(roles.begin(), roles.end(), colours_.begin(), [](QRgb c) { return QColor(c); });
    std::transform(sections.begin(), sections.end(), sections_.begin(),
                   [](QRgb c) { return QColor(c); });
    const QColor ground = colour(ColourRole::pane);
    std::transform(sections_.begin(), sections_.end(), sectionTexts_.begin(),
                   [&](const QColor& c) { return withContrast(c, ground, text_contrast); });
}

const Theme& Theme::light() {
    static const Theme theme(false, light_roles, light_sections);
    return theme;
}

const Theme& Theme::dark() {
    static const Theme theme(true, dark_roles, dark_sections);
    return theme;
}

const Theme& Theme::of(const QPalette& palette) {
    return palette.color(QPalette::Window).lightness() < 128 ? dark() : light();
}

QColor Theme::section(std::size_t index) const {
    return sections_[index % sections_.size()];
}

QColor Theme::sectionText(std::size_t index) const {
    return sectionTexts_[index % sectionTexts_.size()];
}

QColor Theme::state(State state) const {
    switch (state) {
    case State::met:
        return colour(ColourRole::met);
    case State::unmet:
        return colour(ColourRole::unmet);
    case State::undetermined:
        break;
    }
    return colour(ColourRole::muted);
}

QColor Theme::faint(ColourRole role, double share) const {
    const QColor over = colour(role);
    const QColor ground = colour(ColourRole::pane);
    return {mixedChannel(over.red(), ground.red(), share),
            mixedChannel(over.green(), ground.green(), share),
            mixedChannel(over.blue(), ground.blue(), share)};
}

QPalette Theme::palette() const {
    QPalette p;
    const QColor ink = colour(ColourRole::ink);
    const QColor muted = colour(ColourRole::muted);
    p.setColor(QPalette::Window, colour(ColourRole::paper));
    p.setColor(QPalette::Base, colour(ColourRole::pane));
    p.setColor(QPalette::AlternateBase, colour(ColourRole::paper));
    p.setColor(QPalette::Button, colour(ColourRole::paper));
    p.setColor(QPalette::ToolTipBase, colour(ColourRole::pane));
    p.setColor(QPalette::Light, colour(ColourRole::pane));
    p.setColor(QPalette::Midlight, colour(ColourRole::grid));
    p.setColor(QPalette::Mid, colour(ColourRole::hairline));
    p.setColor(QPalette::Dark, colour(ColourRole::graphite));
    for (const auto role : {QPalette::WindowText, QPalette::Text, QPalette::ButtonText,
                            QPalette::ToolTipText, QPalette::BrightText})
        p.setColor(role, ink);
    p.setColor(QPalette::PlaceholderText, muted);
    for (const auto role : {QPalette::WindowText, QPalette::Text, QPalette::ButtonText})
        p.setColor(QPalette::Disabled, role, muted);
    p.setColor(QPalette::Highlight, colour(ColourRole::accent));
    p.setColor(QPalette::HighlightedText,
               dark_ ? colour(ColourRole::paper) : colour(ColourRole::pane));
    p.setColor(QPalette::Link, colour(ColourRole::accent));
    return p;
}

double contrastOf(const QColor& first, const QColor& second) {
    const double a = luminanceOf(first);
    const double b = luminanceOf(second);
    return (std::max(a, b) + 0.05) / (std::min(a, b) + 0.05);
}

QColor withContrast(QColor colour, const QColor& ground, double contrast) {
    const bool lighten = luminanceOf(ground) < 0.18; // where black and white stand out alike
    float hue = 0.0F;
    float saturation = 0.0F;
    float lightness = 0.0F;
    colour.getHslF(&hue, &saturation, &lightness);
    while (contrastOf(colour, ground) < contrast && lightness > 0.0F && lightness < 1.0F) {
        lightness = std::clamp(lightness + (lighten ? 0.01F : -0.01F), 0.0F, 1.0F);
        colour = QColor::fromHslF(std::max(hue, 0.0F), saturation, lightness);
    }
    return colour;
}

QString markOf(State state) {
    switch (state) {
    case State::met:
        return QStringLiteral("\u2713");
    case State::unmet:
        return QStringLiteral("\u2717");
    case State::undetermined:
        break;
    }
    return QStringLiteral("?");
}

QFont fontOf(FontRole role) {
    QFont font = QApplication::font();
    if (role == FontRole::small && font.pointSizeF() > 0.0)
        font.setPointSizeF(font.pointSizeF() * 0.88);
    else if (role == FontRole::small)
        font.setPixelSize(static_cast<int>(std::lround(font.pixelSize() * 0.88)));
    if (role == FontRole::strong)
        font.setWeight(QFont::DemiBold);
    return font;
}

} // namespace cornerwright
