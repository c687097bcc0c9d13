#include "widgets/cases/cases_panel.h"

#include "widgets/cases/case_edits.h"
#include "widgets/cases/case_facts.h"
#include "widgets/cases/case_row.h"
#include "widgets/cases/formula_entry.h"
#include "widgets/document/document.h"
#include "widgets/parts/link_button.h"
#include "widgets/parts/text_label.h"
#include "widgets/view_state.h"

#include <QScrollArea>
#include <QVBoxLayout>

namespace cornerwright {

CasesPanel::CasesPanel(Document& document, ViewState& viewState, QWidget* parent)
    : PanelFrame(tr("Plant cases"), parent),
      document_(document),
      viewState_(viewState),
      scroll_(new QScrollArea(this)),
      list_(new QWidget),
      listLayout_(new QVBoxLayout(list_)),
      formula_(new FormulaEntry(this)),
      foot_(new TextLabel(QString(), TextLabel::Kind::muted, this)),
      fit_(new LinkButton(tr("fit a model"), this)) {
    auto* formulaButton = new LinkButton(tr("+ formula"), this);
    formulaButton->setAccessibleName(tr("Add a plant case from a formula"));
    auto* measurementButton = new LinkButton(tr("+ measurement"), this);
    measurementButton->setAccessibleName(tr("Add plant cases from measurement files"));
    addToHead(formulaButton);
    addToHead(measurementButton);
    connect(formulaButton, &LinkButton::clicked, this, &CasesPanel::beginFormula);
    connect(measurementButton, &LinkButton::clicked, this, &CasesPanel::measurementAsked);

    listLayout_->setContentsMargins(5, 0, 5, 0);
    listLayout_->setSpacing(1);
    listLayout_->addStretch(1);
    scroll_->setWidget(list_);
    scroll_->setWidgetResizable(true);
    scroll_->setFrameShape(QFrame::NoFrame);
    scroll_->setHorizontalScrollBarPolicy(Qt::ScrollBarAlwaysOff);
    scroll_->setFocusPolicy(Qt::NoFocus);
    scroll_->setAccessibleName(tr("Plant cases"));
    scroll_->viewport()->setAutoFillBackground(false);
    list_->setAutoFillBackground(false);
    foot_->setContentsMargins(11, 2, 11, 2);
    foot_->setWordWrap(true);
    body()->addWidget(scroll_, 1);
    body()->addWidget(formula_);
    body()->addWidget(foot_);
    fit_->setAccessibleName(tr("Fit a model to the shown case"));
    body()->addWidget(fit_, 0, Qt::AlignLeft);
    connect(fit_, &LinkButton::clicked, this, [this] { Q_EMIT fitAsked(viewState_.shownCase()); });

    connect(formula_, &FormulaEntry::entered, this,
            [this](const QString& name, const QString& text) {
                const QString free = freeCaseName(document_.project(), name);
                const PlantCase added{free.toStdString(), FormulaSource{text.toStdString()}};
                if (document_.apply(withCaseAdded(document_.project(), added),
                                    tr("Add case %1").arg(free))) {
                    viewState_.setShownCase(document_.project().plant_cases.size() - 1);
                }
            });
    connect(&document_, &Document::projectChanged, this, &CasesPanel::refresh);
    connect(&viewState_, &ViewState::shownCaseChanged, this, &CasesPanel::refresh);
    connect(&viewState_, &ViewState::hiddenCasesChanged, this, &CasesPanel::refreshMarks);
    refresh();
}

void CasesPanel::beginFormula() {
    formula_->open();
}

void CasesPanel::setContent(const PaneContent& content) {
    content_ = content;
    refresh();
}

void CasesPanel::makeRows(std::size_t count) {
    while (rows_.size() > count) {
        rows_.back()->hide();
        rows_.back()->deleteLater();
        rows_.pop_back();
    }
    while (rows_.size() < count) {
        const std::size_t index = rows_.size();
        auto* row = new CaseRow(list_);
        connect(row, &CaseRow::drawnToggled, this,
                [this, index](bool drawn) { setDrawn(index, drawn); });
        connect(row, &CaseRow::showAsked, this, [this, index] { viewState_.setShownCase(index); });
        connect(row, &CaseRow::renameAsked, this, [this, index](const QString& name) {
            document_.apply(withCaseRenamed(document_.project(), index, name),
                            tr("Rename case %1").arg(name));
        });
        connect(row, &CaseRow::fitAsked, this, [this, index] { Q_EMIT fitAsked(index); });
        connect(row, &CaseRow::removeAsked, this, [this, index] {
            const QString name = rows_[index]->name();
            document_.apply(withCaseRemoved(document_.project(), index),
                            tr("Remove case %1").arg(name));
        });
        listLayout_->insertWidget(static_cast<int>(index), row);
        rows_.push_back(row);
    }
}

void CasesPanel::refresh() {
    const Project& project = document_.project();
    makeRows(project.plant_cases.size());
    const Assessment* assessment = content_.assessment.get();
    for (std::size_t i = 0; i < rows_.size(); ++i) {
        const PlantCase& plantCase = project.plant_cases[i];
        QStringList facts;
        const QString binding =
            assessment == nullptr ? QString() : bindingFact(assessment->verdict, plantCase.name);
        if (!binding.isEmpty()) {
            facts << binding;
        }
        facts << caseFact(plantCase);
        rows_[i]->setCase(QString::fromStdString(plantCase.name), facts.join(QStringLiteral(" · ")),
                          !binding.isEmpty());
        rows_[i]->setMeasured(isMeasured(plantCase));
    }
    refreshMarks();

    const std::size_t shown = viewState_.shownCase();
    fit_->setVisible(shown < rows_.size() && isMeasured(project.plant_cases[shown]));
    if (shown >= rows_.size()) {
        foot_->setText(tr("No plant yet: add a measurement or a formula."));
        return;
    }
    const bool assessed = assessment != nullptr && shown < assessment->cases.size() &&
                          assessment->cases[shown].name == project.plant_cases[shown].name;
    foot_->setText(shownCaseFacts(project, project.plant_cases[shown],
                                  assessed ? &assessment->cases[shown].design.figures : nullptr)
                       .join(QLatin1Char('\n')));
}

void CasesPanel::refreshMarks() {
    for (std::size_t i = 0; i < rows_.size(); ++i) {
        rows_[i]->setDrawn(!viewState_.hiddenCases().contains(i));
        rows_[i]->setShown(viewState_.shownCase() == i);
    }
}

void CasesPanel::setDrawn(std::size_t index, bool drawn) {
    std::set<std::size_t> hidden = viewState_.hiddenCases();
    if (drawn) {
        hidden.erase(index);
    } else {
        hidden.insert(index);
    }
    viewState_.setHiddenCases(std::move(hidden));
}

} // namespace cornerwright
