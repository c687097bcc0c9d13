#include "widgets/panes/quality_pane.h"

#include "core/fitting/fit.h"
#include "core/measurement/random_error.h"
#include "widgets/figure_text.h"
#include "widgets/panes/axis_styles.h"
#include "widgets/panes/csv_table.h"
#include "widgets/panes/legend_widget.h"
#include "widgets/panes/measurement_words.h"
#include "widgets/panes/painting.h"
#include "widgets/view_state.h"

#include <QAction>
#include <QActionGroup>
#include <QLabel>
#include <QVBoxLayout>

#include <algorithm>
#include <array>
#include <cmath>
#include <limits>

namespace cornerwright {

namespace {

constexpr double main_width = 1.5;
constexpr double faint_case = 0.26;
/// A response worse than this is not worth an axis that shows it.
constexpr double greatest_error_percent = 100.0;
constexpr double greatest_misfit_db = 12.0;

} // namespace

QualityPane::QualityPane(ViewState& state, QWidget* parent)
    : FrequencyPane(state, linearAxis({}), parent), words_(new QLabel(this)) {
    setAccessibleName(title());
    setRanges({ranges().x, {0.0, 1.05}});
    words_->setWordWrap(true);
    words_->setTextInteractionFlags(Qt::TextSelectableByMouse);
    words_->setContentsMargins(8, 2, 8, 2);
    words_->setAccessibleName(tr("What the measurement file says"));
    words_->setSizePolicy(QSizePolicy::Preferred, QSizePolicy::Minimum);
    auto* column = static_cast<QVBoxLayout*>(layout());
    column->insertWidget(0, words_);
    column->setStretchFactor(plotWidget(), 1);
    auto* group = new QActionGroup(this);
    const std::array<std::pair<Quality, QString>, 3> names{
        {{Quality::coherence, tr("coherence")},
         {Quality::random_error, tr("random error")},
         {Quality::misfit, tr("fit misfit")}}};
    for (const auto& [quality, name] : names) {
        QAction* action = addPaneAction(name, [this, quality = quality] { showQuality(quality); });
        action->setCheckable(true);
        action->setChecked(quality == quality_);
        group->addAction(action);
        legend().addSwitch(action);
    }
}

void QualityPane::showQuality(Quality quality) {
    quality_ = quality;
    const QString unit = quality == Quality::misfit         ? QStringLiteral("dB")
                         : quality == Quality::random_error ? QStringLiteral("%")
                                                            : QString();
    setAxes(frequencyAxis(viewState()), linearAxis(unit));
    fit();
}

QualityPane::CaseQuality QualityPane::qualityOf(const PlantCase& plantCase) {
    CaseQuality quality;
    const auto* source = std::get_if<MeasurementSource>(&plantCase.source);
    if (source == nullptr || !source->response)
        return quality;
    quality.response = source->response;
    quality.fit = source->fit;
    quality.coherence = source->response->coherence;
    quality.random_error_percent = random_errors(*source->response);
    for (double& error : quality.random_error_percent)
        error *= 100.0;
    if (source->fit)
        quality.misfit_db = misfits_db(source->fit->model, *source->response);
    return quality;
}

void QualityPane::refreshQualities() {
    const std::size_t count = project() != nullptr ? project()->plant_cases.size() : 0;
    qualities_.resize(count);
    for (std::size_t i = 0; i < count; ++i) {
        const PlantCase& plantCase = project()->plant_cases[i];
        const auto* source = std::get_if<MeasurementSource>(&plantCase.source);
        const bool isSame = source == nullptr ? !qualities_[i].response
                                              : qualities_[i].response == source->response &&
                                                    qualities_[i].fit == source->fit;
        if (!isSame)
            qualities_[i] = qualityOf(plantCase);
    }
}

void QualityPane::contentChanged() {
    refreshQualities();
    words_->setFont(fontOf(FontRole::small));
    words_->setText(words());
    const QColor ink = theme().colour(ColourRole::ink);
    legend().setEntries(
        {{tr("case shown"), curvePen(ink, main_width)},
         {tr("other cases"), curvePen(theme().faint(ColourRole::ink, faint_case))}});
}

QString QualityPane::words() const {
    const std::size_t index = viewState().shownCase();
    if (project() == nullptr || index >= project()->plant_cases.size())
        return {};
    return measurementWords(project()->plant_cases[index]).join(QStringLiteral(" · "));
}

const std::vector<double>& QualityPane::shownOf(const CaseQuality& quality) const {
    switch (quality_) {
    case Quality::random_error:
        return quality.random_error_percent;
    case Quality::misfit:
        return quality.misfit_db;
    case Quality::coherence:
        break;
    }
    return quality.coherence;
}

std::optional<AxisRange> QualityPane::fittedVertical(const AxisRange& frequencies) const {
    if (quality_ == Quality::coherence)
        return AxisRange{-0.02, 1.05};
    const double greatest =
        quality_ == Quality::misfit ? greatest_misfit_db : greatest_error_percent;
    std::vector<double> values{0.0, quality_ == Quality::misfit ? 1.0 : 5.0};
    for (const CaseQuality& quality : qualities_) {
        if (!quality.response)
            continue;
        for (const double value : within(quality.response->w_rad_s, shownOf(quality), frequencies))
            values.push_back(std::min(value, greatest));
    }
    return rangeOf(values, 0.04, 1e-3);
}

void QualityPane::drawCase(QPainter& painter, const CaseQuality& quality, const QPen& pen) const {
    if (quality.response)
        drawFunction(painter, pen, quality.response->w_rad_s, shownOf(quality), mapX(), mapY());
}

void QualityPane::drawCurves(QPainter& painter) {
    const std::size_t shown = viewState().shownCase();
    for (std::size_t i = 0; i < qualities_.size(); ++i)
        if (i != shown && !isHidden(i))
            drawCase(painter, qualities_[i], curvePen(theme().faint(ColourRole::ink, faint_case)));
    if (shown < qualities_.size())
        drawCase(painter, qualities_[shown], curvePen(theme().colour(ColourRole::ink), main_width));
}

QString QualityPane::valueText(double value) const {
    switch (quality_) {
    case Quality::random_error:
        return numberText(value) + QStringLiteral(" %");
    case Quality::misfit:
        return decibelText(value);
    case Quality::coherence:
        break;
    }
    return fixedText(value, 3);
}

void QualityPane::drawMarks(QPainter& painter) {
    const std::size_t shown = viewState().shownCase();
    const bool isKnown = shown < qualities_.size() && !shownOf(qualities_[shown]).empty();
    if (!isKnown) {
        const QString sentence =
            quality_ == Quality::misfit ? tr("no fit of this case") : tr("not known for this case");
        const LabelStyle style{theme().colour(ColourRole::muted), fontOf(FontRole::strong),
                               LabelGround::pane};
        QRectF area({}, labelSize(sentence, style.font));
        area.moveCenter(plotArea().center());
        drawLabel(painter, area, sentence, style, theme());
    }
    QString reading;
    const auto w = viewState().cursorRadS();
    if (w && isKnown)
        if (const auto value = interpolateOnLog(qualities_[shown].response->w_rad_s,
                                                shownOf(qualities_[shown]), *w))
            reading = QStringLiteral("   ") + valueText(*value);
    drawCursor(painter, reading);
}

QString QualityPane::csv() const {
    CsvTable table({tr("case"), QStringLiteral("frequency_rad_s"), QStringLiteral("coherence"),
                    QStringLiteral("random_error_percent"), QStringLiteral("misfit_db")});
    // What is not known stays an empty cell.
    constexpr double unknown = std::numeric_limits<double>::quiet_NaN();
    const auto at = [](const std::vector<double>& values, std::size_t i) {
        return i < values.size() ? values[i] : unknown;
    };
    for (std::size_t c = 0; c < qualities_.size(); ++c) {
        const CaseQuality& quality = qualities_[c];
        for (std::size_t i = 0; quality.response && i < quality.response->w_rad_s.size(); ++i)
            table.addRow({QString::fromStdString(project()->plant_cases[c].name)},
                         {quality.response->w_rad_s[i], at(quality.coherence, i),
                          at(quality.random_error_percent, i), at(quality.misfit_db, i)});
    }
    return table.text();
}

} // namespace cornerwright
