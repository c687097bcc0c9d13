#include "widgets/ledger/ledger_panel.h"

#include "widgets/document/document.h"
#include "widgets/figure_text.h"
#include "widgets/help/help_topic.h"
#include "widgets/ledger/ledger_delegate.h"
#include "widgets/ledger/ledger_model.h"
#include "widgets/ledger/requirement_editor.h"
#include "widgets/ledger/requirement_edits.h"
#include "widgets/parts/glyph_button.h"
#include "widgets/parts/link_button.h"
#include "widgets/theme.h"
#include "widgets/view_state.h"

#include <QHeaderView>
#include <QKeyEvent>
#include <QMenu>
#include <QTableView>
#include <QVBoxLayout>

namespace cornerwright {

namespace {
// Where a new frequency or time limit starts when no crossover tells a better place.
constexpr double fallbackCrossover = 10.0;
} // namespace

LedgerPanel::LedgerPanel(Document& document, ViewState& viewState, QWidget* parent)
    : PanelFrame(tr("Requirements"), parent),
      document_(document),
      viewState_(viewState),
      model_(new LedgerModel(this)),
      view_(new QTableView(this)),
      editor_(new RequirementEditor(this)),
      addMenu_(new QMenu(this)) {
    auto* addButton = new LinkButton(tr("+ add requirement"), this);
    addButton->setAccessibleName(tr("Add requirement"));
    addMenu_->setTitle(tr("Add requirement"));
    for (const Measure measure : all_measures()) {
        addMenu_->addAction(measureText(measure), this, [this, measure] { add(measure); });
    }
    connect(addButton, &LinkButton::clicked, this, [this, addButton] {
        addMenu_->popup(addButton->mapToGlobal(QPoint(0, addButton->height())));
    });
    addToHead(addButton);
    auto* help = new GlyphButton(Glyph::help, tr("What is the selected requirement?"), this);
    addToHead(help);
    connect(help, &GlyphButton::clicked, this, [this] { Q_EMIT helpAsked(helpTopicOf(view_)); });
    setHelpTopic(*this, QStringLiteral("verdict"));
    buildView();
    body()->addWidget(view_, 1);
    body()->addWidget(editor_);
    editor_->hide();

    connect(editor_, &RequirementEditor::closed, this, &LedgerPanel::endEditing);
    connect(editor_, &RequirementEditor::removeAsked, this, [this] {
        if (edited_) {
            removeRequirement(*edited_);
        }
    });
    connect(editor_, &RequirementEditor::edited, this, [this](const Requirement& next) {
        if (edited_) {
            document_.apply(withRequirementChanged(document_.project(), *edited_, next),
                            tr("Change %1").arg(measureText(next.measure)));
        }
    });
    connect(&document_, &Document::projectChanged, this, &LedgerPanel::refreshEditor);
    connect(&viewState_, &ViewState::unitChanged, this, [this] {
        model_->setShowsHertz(viewState_.showsHertz());
        editor_->setShowsHertz(viewState_.showsHertz());
    });
}

void LedgerPanel::buildView() {
    view_->setModel(model_);
    view_->setItemDelegate(new LedgerDelegate(view_));
    view_->setAccessibleName(tr("Requirement ledger"));
    view_->setFrameShape(QFrame::NoFrame);
    view_->setShowGrid(false);
    view_->setSelectionBehavior(QAbstractItemView::SelectRows);
    view_->setSelectionMode(QAbstractItemView::SingleSelection);
    view_->setEditTriggers(QAbstractItemView::NoEditTriggers);
    view_->setTabKeyNavigation(false);
    view_->setHorizontalScrollMode(QAbstractItemView::ScrollPerPixel);
    view_->verticalHeader()->hide();
    view_->verticalHeader()->setMinimumSectionSize(1);
    view_->installEventFilter(this);
    QHeaderView* header = view_->horizontalHeader();
    header->setDefaultAlignment(Qt::AlignLeft | Qt::AlignVCenter);
    header->setHighlightSections(false);
    header->setSectionsClickable(false);
    header->setSectionResizeMode(QHeaderView::Interactive);
    header->setSectionResizeMode(LedgerModel::where, QHeaderView::Stretch);
    header->setMinimumSectionSize(24);
    fitColumns();
    dressHeader();
    connect(view_, &QTableView::clicked, this,
            [this](const QModelIndex& index) { goToWorst(index.row()); });
    connect(view_, &QTableView::doubleClicked, this,
            [this](const QModelIndex& index) { edit(model_->requirementOf(index.row())); });
    connect(view_->selectionModel(), &QItemSelectionModel::currentRowChanged, this,
            &LedgerPanel::followTopic);
    connect(model_, &QAbstractItemModel::layoutChanged, this, &LedgerPanel::followTopic);
    connect(model_, &QAbstractItemModel::modelReset, this, &LedgerPanel::followTopic);
    view_->setContextMenuPolicy(Qt::CustomContextMenu);
    connect(view_, &QWidget::customContextMenuRequested, this, &LedgerPanel::showRowMenu);
}

void LedgerPanel::followTopic() {
    const QModelIndex row = view_->currentIndex();
    const std::string_view measure =
        row.isValid() ? name_of(model_->result(row.row()).requirement.measure) : "";
    setHelpTopic(*view_, QString::fromUtf8(measure.data(), std::ssize(measure)));
}

void LedgerPanel::showRowMenu(const QPoint& at) {
    const QModelIndex index = view_->indexAt(at);
    if (!index.isValid()) {
        return;
    }
    const std::size_t requirement = model_->requirementOf(index.row());
    auto* menu = new QMenu(this);
    menu->setAttribute(Qt::WA_DeleteOnClose);
    menu->addAction(tr("Go to the worst\tSpace"), this, [this, requirement] {
        if (const int row = model_->rowOf(requirement); row >= 0) {
            goToWorst(row);
        }
    });
    menu->addAction(tr("Change the limit\tEnter"), this,
                    [this, requirement] { edit(requirement); });
    menu->addAction(tr("Remove\tDel"), this,
                    [this, requirement] { removeRequirement(requirement); });
    menu->addSeparator();
    menu->addAction(tr("What is this?\tF1"), this,
                    [this] { Q_EMIT helpAsked(helpTopicOf(view_)); });
    menu->popup(view_->viewport()->mapToGlobal(at));
}

void LedgerPanel::fitColumns() {
    // In average characters, so that the columns follow the font and the scale.
    constexpr std::pair<int, int> widths[] = {
        {LedgerModel::mark, 4},   {LedgerModel::measure, 30},  {LedgerModel::limit, 13},
        {LedgerModel::worst, 11}, {LedgerModel::headroom, 20}, {LedgerModel::distance, 16},
        {LedgerModel::state, 18},
    };
    const QFontMetrics metrics(fontOf(FontRole::strong));
    for (const auto& [column, characters] : widths) {
        view_->setColumnWidth(column, characters * metrics.averageCharWidth());
    }
    view_->verticalHeader()->setDefaultSectionSize(metrics.height() + 6);
    view_->verticalHeader()->setSectionResizeMode(QHeaderView::Fixed);
}

void LedgerPanel::dressHeader() {
    const QString muted = Theme::of(palette()).colour(ColourRole::muted).name();
    view_->horizontalHeader()->setStyleSheet(
        QStringLiteral("QHeaderView { background: transparent; border: none; }"
                       "QHeaderView::section { background: transparent; border: none;"
                       " padding: 1px 6px; color: %1; }")
            .arg(muted));
}

void LedgerPanel::changeEvent(QEvent* event) {
    PanelFrame::changeEvent(event);
    if (event->type() == QEvent::PaletteChange) {
        dressHeader();
    }
}

void LedgerPanel::setContent(const PaneContent& content) {
    content_ = content;
    model_->setAssessment(content.assessment, content.ghost);
}

void LedgerPanel::goToWorst(int row) {
    const Judgement& worst = model_->result(row).worst;
    const std::vector<PlantCase>& cases = document_.project().plant_cases;
    for (std::size_t i = 0; i < cases.size(); ++i) {
        if (cases[i].name == worst.case_name) {
            viewState_.setShownCase(i);
            viewState_.setFollowed(FollowedRequirement{model_->requirementOf(row), i, worst.loop});
        }
    }
    if (!worst.at_rad_s.is_value() || worst.at_rad_s.value() <= 0.0) {
        return;
    }
    const double w = worst.at_rad_s.value();
    const auto window = viewState_.frequencyWindowRadS();
    if (window && (w < window->first || w > window->second)) {
        viewState_.setFrequencyWindowRadS(std::nullopt);
    }
    viewState_.setCursorRadS(w);
}

void LedgerPanel::goToFirst() {
    if (model_->rowCount() > 0) {
        view_->selectRow(0);
        view_->setFocus(Qt::OtherFocusReason);
        goToWorst(0);
    }
}

void LedgerPanel::add(Measure measure) {
    double w = fallbackCrossover;
    if (content_.assessment && viewState_.shownCase() < content_.assessment->cases.size()) {
        const auto& crossovers = content_.assessment->cases[viewState_.shownCase()]
                                     .design.figures.frequency.crossovers_rad_s;
        w = crossovers.empty() ? w : crossovers.back();
    }
    document_.apply(withRequirementAdded(document_.project(), newRequirement(measure, w)),
                    tr("Add %1").arg(measureText(measure)));
    edit(document_.project().requirements.size() - 1);
}

void LedgerPanel::edit(std::size_t requirement) {
    edited_ = requirement;
    editor_->setShowsHertz(viewState_.showsHertz());
    refreshEditor();
    editor_->show();
    editor_->begin();
}

void LedgerPanel::endEditing() {
    edited_.reset();
    editor_->hide();
    view_->setFocus(Qt::OtherFocusReason);
}

void LedgerPanel::removeRequirement(std::size_t requirement) {
    endEditing();
    if (requirement >= document_.project().requirements.size()) {
        return; // gone while its menu stood open
    }
    const QString name = measureText(document_.project().requirements.at(requirement).measure);
    document_.apply(withRequirementRemoved(document_.project(), requirement),
                    tr("Remove %1").arg(name));
}

void LedgerPanel::refreshEditor() {
    if (!edited_) {
        return;
    }
    if (*edited_ >= document_.project().requirements.size()) {
        endEditing();
        return;
    }
    editor_->setRequirement(document_.project().requirements[*edited_]);
}

bool LedgerPanel::eventFilter(QObject* watched, QEvent* event) {
    if (watched == view_ && event->type() == QEvent::KeyPress && view_->currentIndex().isValid()) {
        const int row = view_->currentIndex().row();
        switch (static_cast<QKeyEvent*>(event)->key()) {
        case Qt::Key_Return:
        case Qt::Key_Enter:
            edit(model_->requirementOf(row));
            return true;
        case Qt::Key_Delete:
            removeRequirement(model_->requirementOf(row));
            return true;
        case Qt::Key_Space:
            goToWorst(row);
            return true;
        default:
            break;
        }
    }
    if (event->type() == QEvent::ApplicationFontChange || event->type() == QEvent::FontChange) {
        fitColumns();
    }
    return PanelFrame::eventFilter(watched, event);
}

} // namespace cornerwright
