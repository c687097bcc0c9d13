#include "widgets/trials/trials_pane.h"

#include "widgets/parts/glyph_button.h"
#include "widgets/parts/link_button.h"
#include "widgets/parts/text_label.h"
#include "widgets/theme.h"
#include "widgets/trials/trial_book.h"
#include "widgets/trials/trial_comparison.h"
#include "widgets/view_state.h"

#include <QHBoxLayout>
#include <QHeaderView>
#include <QLineEdit>
#include <QRadioButton>
#include <QTableWidget>
#include <QVBoxLayout>

namespace cornerwright {

namespace {

enum Column { measure, limit, then, now, change, columnCount };

QString changeWithWord(const TrialDifference& difference) {
    if (difference.change.isEmpty()) {
        return {};
    }
    const QString word = difference.better > 0   ? TrialsPane::tr("▲ better")
                         : difference.better < 0 ? TrialsPane::tr("▼ worse")
                                                 : QString();
    return QStringLiteral("%1  %2").arg(difference.change, word).trimmed();
}

} // namespace

TrialsPane::TrialsPane(ViewState& viewState, TrialBook& book, QWidget* parent)
    : Pane(viewState, parent),
      book_(book),
      layout_(new QVBoxLayout(this)),
      hint_(new TextLabel(tr("No trial kept yet. Keep (Ctrl+K) puts a copy of the present design "
                             "here to compare with."),
                          TextLabel::Kind::muted, this)),
      table_(new QTableWidget(0, columnCount, this)) {
    layout_->setContentsMargins(10, 2, 10, 6);
    layout_->setSpacing(4);
    hint_->setWordWrap(true);
    hint_->setAlignment(Qt::AlignTop);
    hint_->setSizePolicy(QSizePolicy::Preferred, QSizePolicy::Maximum);
    layout_->addWidget(hint_);
    layout_->addWidget(table_, 1);
    layout_->addStretch(0);
    table_->setAccessibleName(tr("Differences between the trial and the present design"));
    table_->setHorizontalHeaderLabels(
        {tr("measure"), tr("limit"), tr("trial"), tr("now"), tr("change")});
    table_->verticalHeader()->hide();
    table_->verticalHeader()->setMinimumSectionSize(1);
    table_->verticalHeader()->setDefaultSectionSize(table_->fontMetrics().height() + 6);
    table_->setFrameShape(QFrame::NoFrame);
    table_->setShowGrid(false);
    table_->setEditTriggers(QAbstractItemView::NoEditTriggers);
    table_->setSelectionMode(QAbstractItemView::NoSelection);
    table_->setTabKeyNavigation(false);
    table_->horizontalHeader()->setSectionResizeMode(QHeaderView::ResizeToContents);
    table_->horizontalHeader()->setStretchLastSection(true);
    setFocusProxy(table_);
    connect(&book_, &TrialBook::changed, this, &TrialsPane::showTrials);
    connect(&viewState, &ViewState::unitChanged, this, &TrialsPane::showDifferences);
    showTrials();
}

void TrialsPane::setContent(const PaneContent& content) {
    content_ = content;
    showDifferences();
}

QWidget* TrialsPane::makeRow(std::size_t index) {
    const Trial& trial = book_.trials()[index];
    auto* row = new QWidget(rows_);
    auto* line = new QHBoxLayout(row);
    line->setContentsMargins(0, 0, 0, 0);
    auto* pick = new QRadioButton(row);
    pick->setChecked(book_.compared() == index);
    pick->setAccessibleName(tr("Compare with %1").arg(trial.name));
    pick->setToolTip(pick->accessibleName());
    auto* name = new QLineEdit(trial.name, row);
    name->setFrame(false);
    name->setAccessibleName(tr("Name of the trial"));
    auto* back = new LinkButton(tr("Return to it"), row);
    back->setAccessibleName(tr("Return to %1").arg(trial.name));
    auto* remove = new GlyphButton(Glyph::remove, tr("Forget %1").arg(trial.name), row);
    line->addWidget(pick);
    line->addWidget(name, 1);
    line->addWidget(back);
    line->addWidget(remove);
    // The row goes when the book changes, so what it does is queued behind its own signal.
    connect(
        pick, &QRadioButton::clicked, &book_, [this, index] { book_.compare(index); },
        Qt::QueuedConnection);
    connect(name, &QLineEdit::editingFinished, &book_,
            [this, index, name] { book_.rename(index, name->text().trimmed()); });
    connect(back, &LinkButton::clicked, this, [this, index] {
        const Trial& wanted = book_.trials()[index];
        Q_EMIT edited(wanted.project, tr("Return to %1").arg(wanted.name));
    });
    connect(
        remove, &GlyphButton::clicked, &book_, [this, index] { book_.remove(index); },
        Qt::QueuedConnection);
    return row;
}

void TrialsPane::showTrials() {
    if (rows_ != nullptr) {
        rows_->hide();
        rows_->deleteLater();
    }
    rows_ = new QWidget(this);
    auto* list = new QVBoxLayout(rows_);
    list->setContentsMargins(0, 0, 0, 0);
    list->setSpacing(2);
    for (std::size_t i = 0; i < book_.trials().size(); ++i) {
        list->addWidget(makeRow(i));
    }
    layout_->insertWidget(0, rows_);
    hint_->setVisible(book_.trials().empty());
    showDifferences();
}

void TrialsPane::showDifferences() {
    const Trial* trial = book_.comparedTrial();
    table_->setVisible(trial != nullptr);
    if (trial == nullptr || !trial->assessment || !content_.assessment) {
        table_->setRowCount(0);
        return;
    }
    const Theme& theme = Theme::of(palette());
    const std::vector<TrialDifference> all = differencesOf(
        trial->assessment->verdict, content_.assessment->verdict, viewState().showsHertz());
    table_->setRowCount(static_cast<int>(all.size()));
    for (int i = 0; i < table_->rowCount(); ++i) {
        const TrialDifference& row = all[static_cast<std::size_t>(i)];
        const auto put = [this, i](Column column, const QString& text, const QColor& colour) {
            auto* item = new QTableWidgetItem(text);
            item->setForeground(colour);
            table_->setItem(i, column, item);
        };
        const QColor ink = theme.colour(ColourRole::ink);
        const QString space = QStringLiteral(" ");
        put(measure, row.measure, ink);
        put(limit, row.limit, theme.colour(ColourRole::muted));
        put(then, row.then.isEmpty() ? QString() : markOf(row.stateThen) + space + row.then,
            theme.state(row.stateThen));
        put(now, markOf(row.stateNow) + space + row.now, theme.state(row.stateNow));
        put(change, changeWithWord(row), ink);
    }
}

} // namespace cornerwright
