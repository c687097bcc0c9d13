#include "widgets/design/tolerance_pane.h"

#include "core/engine/placement_problem.h"
#include "widgets/design/run_row.h"
#include "widgets/design/tolerance_form.h"
#include "widgets/figure_text.h"
#include "widgets/parts/histogram_view.h"
#include "widgets/parts/link_button.h"
#include "widgets/parts/text_label.h"
#include "widgets/view_state.h"

#include <QHBoxLayout>
#include <QHeaderView>
#include <QTableWidget>
#include <QVBoxLayout>

namespace cornerwright {

namespace {

enum Column { requirement, met, unmet, share, columnCount };

QString percentText(double part) {
    constexpr int digits = 3;
    return TolerancePane::tr("%1 %").arg(numberText(100.0 * part, digits));
}

} // namespace

TolerancePane::TolerancePane(ViewState& viewState, QWidget* parent)
    : Pane(viewState, parent),
      form_(new ToleranceForm(this)),
      yield_(new TextLabel(QString(), TextLabel::Kind::strong, this)),
      worst_(new TextLabel(QString(), TextLabel::Kind::muted, this)),
      histogram_(new HistogramView(this)),
      table_(new QTableWidget(0, columnCount, this)),
      keep_(new LinkButton(tr("Keep worst sample as plant case"), this)),
      row_(new RunRow(tr("Run samples"), this)) {
    auto* whole = new QVBoxLayout(this);
    whole->setContentsMargins(10, 2, 10, 6);
    whole->setSpacing(4);
    whole->addWidget(form_);
    whole->addWidget(row_);
    whole->addWidget(yield_);
    whole->addWidget(histogram_, 2);
    whole->addWidget(table_, 2);
    whole->addWidget(worst_);
    whole->addWidget(keep_, 0, Qt::AlignLeft);
    yield_->setWordWrap(true);
    worst_->setWordWrap(true);
    histogram_->setAccessibleName(tr("Smallest share of headroom of every sample"));
    table_->setAccessibleName(tr("Requirements over the samples"));
    table_->setHorizontalHeaderLabels(
        {tr("requirement"), tr("met"), tr("unmet"), tr("smallest share")});
    table_->verticalHeader()->hide();
    table_->setFrameShape(QFrame::NoFrame);
    table_->setShowGrid(false);
    table_->setEditTriggers(QAbstractItemView::NoEditTriggers);
    table_->setSelectionMode(QAbstractItemView::NoSelection);
    table_->setTabKeyNavigation(false);
    table_->horizontalHeader()->setStretchLastSection(true);
    keep_->setEnabled(false);
    setFocusProxy(row_->startButton());

    connect(row_, &RunRow::startAsked, this, &TolerancePane::start);
    connect(form_, &ToleranceForm::problemChanged, row_, [this](const QString& problem) {
        problem.isEmpty() ? row_->setNote({}) : row_->setProblem(problem);
    });
    connect(&viewState, &ViewState::unitChanged, this, &TolerancePane::showRequirements);
    connect(keep_, &LinkButton::clicked, this, [this] {
        if (result_.worst) {
            Q_EMIT keepAsked(result_.worst->as_plant,
                             tr("worst sample of %1")
                                 .arg(QString::fromStdString(plants_[result_.worst->plant])));
        }
    });
}

void TolerancePane::setContent(const PaneContent& content) {
    content_ = content;
    tellAge();
}

void TolerancePane::start() {
    form_->takeTyped();
    if (!content_.project || row_->run().isRunning()) {
        return;
    }
    row_->start([this, project = content_.project,
                 asked = form_->options()](const BackgroundRun::Proceed& proceed) {
        ToleranceOptions options = asked;
        options.proceed = [&proceed](std::size_t done, std::size_t of) {
            return proceed(static_cast<double>(done) / static_cast<double>(of));
        };
        const PlacementProblem problem = placement_problem_of(*project);
        const ToleranceResult result = tolerance(problem, options);
        std::vector<std::string> plants;
        for (const PlacementPlant& plant : problem.plants) {
            plants.push_back(plant.name);
        }
        return [this, project, plants, result] { take(project, plants, result); };
    });
}

void TolerancePane::take(const std::shared_ptr<const Project>& project,
                         std::vector<std::string> plants, ToleranceResult result) {
    judged_ = project;
    plants_ = std::move(plants);
    result_ = std::move(result);
    const auto limits = result_.yield_limits();
    yield_->setText(tr("Yield %1: %2 of %3 samples met, %4 unmet, %5 not determined "
                       "(%6 to %7 with 95 % confidence)")
                        .arg(percentText(result_.yield()))
                        .arg(result_.met)
                        .arg(result_.samples())
                        .arg(result_.unmet)
                        .arg(result_.undetermined)
                        .arg(percentText(limits[0]), percentText(limits[1])));
    std::vector<double> shares;
    for (const double merit : result_.merits) {
        if (merit > unstable_merit) {
            shares.push_back(merit);
        }
    }
    histogram_->setValues(shares, 0.0, [](double value) { return numberText(value); });
    keep_->setEnabled(result_.worst.has_value());
    showRequirements();
    tellAge();
}

void TolerancePane::showRequirements() {
    if (!judged_) {
        return;
    }
    const bool hertz = viewState().showsHertz();
    table_->setRowCount(static_cast<int>(result_.requirements.size()));
    for (int row = 0; row < table_->rowCount(); ++row) {
        const auto index = static_cast<std::size_t>(row);
        const ToleranceRequirement& one = result_.requirements[index];
        const auto put = [this, row](Column column, const QString& text) {
            table_->setItem(row, column, new QTableWidgetItem(text));
        };
        put(requirement, requirementText(judged_->requirements[index], hertz) + QLatin1Char(' ') +
                             limitText(judged_->requirements[index], hertz));
        put(met, QString::number(one.met));
        put(unmet, QString::number(one.unmet));
        put(share, one.smallest_share
                       ? figureText(Figure::of(*one.smallest_share), MeasureUnit::plain, hertz)
                       : QStringLiteral("?"));
    }
    table_->resizeColumnsToContents();
    if (!result_.worst) {
        worst_->clear();
        return;
    }
    const WorstSample& sample = *result_.worst;
    const QString why = sample.merit <= unstable_merit
                            ? tr("not stable")
                            : requirementText(judged_->requirements[sample.requirement], hertz);
    worst_->setText(tr("Worst: sample %1, %2, %3")
                        .arg(sample.number)
                        .arg(QString::fromStdString(plants_[sample.plant]), why));
}

void TolerancePane::tellAge() {
    if (!judged_ || row_->run().isRunning()) {
        return;
    }
    const bool isOld = content_.project && !(content_.project->compensator == judged_->compensator);
    row_->setNote(isOld             ? tr("of an earlier design")
                  : result_.stopped ? tr("stopped: the samples judged so far")
                                    : QString());
}

QString TolerancePane::yieldText() const {
    return yield_->text();
}

} // namespace cornerwright
