#include "widgets/import/import_panel.h"

#include "widgets/document/document.h"
#include "widgets/import/column_table.h"
#include "widgets/import/import_form.h"
#include "widgets/import/response_preview.h"
#include "widgets/parts/link_button.h"
#include "widgets/parts/text_label.h"
#include "widgets/view_state.h"

#include <QFileInfo>
#include <QKeyEvent>
#include <QListWidget>
#include <QPushButton>
#include <QScrollArea>
#include <QSplitter>
#include <QVBoxLayout>

#include <algorithm>

namespace cornerwright {

namespace {

/// "✓ unit 7.csv, 800 points", "? …": the state is told by sign and words.
QString listText(const ImportEntry& entry) {
    const QString file = QFileInfo(entry.path).fileName();
    if (!entry.look) {
        return ImportPanel::tr("… %1, being read").arg(file);
    }
    if (entry.look->plant) {
        return ImportPanel::tr("✓ %1, %2 points").arg(file).arg(entry.look->plant->w_rad_s.size());
    }
    return entry.look->isOpen ? ImportPanel::tr("? %1, to be settled").arg(file)
                              : ImportPanel::tr("✗ %1, cannot be read").arg(file);
}

QWidget* scrolled(QWidget* content, const QString& name) {
    auto* area = new QScrollArea;
    area->setWidget(content);
    area->setWidgetResizable(true);
    area->setFrameShape(QFrame::NoFrame);
    area->setAccessibleName(name);
    area->setFocusPolicy(Qt::NoFocus);
    area->viewport()->setAutoFillBackground(false);
    content->setAutoFillBackground(false);
    return area;
}

} // namespace

ImportPanel::ImportPanel(Document& document, ViewState& viewState, QWidget* parent)
    : PanelFrame(tr("Measurements to take in"), parent),
      document_(document),
      list_(new QListWidget(this)),
      table_(new ColumnTable(this)),
      preview_(new ResponsePreview(viewState, this)),
      form_(new ImportForm),
      words_(new TextLabel(QString(), TextLabel::Kind::muted)),
      problem_(new TextLabel(QString(), TextLabel::Kind::problem, this)),
      take_(new QPushButton(tr("Take in"), this)),
      alike_(new LinkButton(tr("settle all files alike"), this)) {
    auto* remove = new LinkButton(tr("leave this file out"), this);
    auto* back = new LinkButton(tr("back without taking in"), this);
    alike_->setToolTip(
        tr("Columns, units, sign, delay and what was measured, for every file here"));
    take_->setToolTip(tr("Make a plant case of every file that is ready"));
    for (QWidget* button : {static_cast<QWidget*>(alike_), static_cast<QWidget*>(remove),
                            static_cast<QWidget*>(back), static_cast<QWidget*>(take_)}) {
        addToHead(button);
    }
    buildLists();
    connect(list_, &QListWidget::currentRowChanged, this, &ImportPanel::refreshShown);
    connect(table_, &ColumnTable::columnChosen, this, &ImportPanel::takeColumn);
    connect(form_, &ImportForm::changed, this, &ImportPanel::takeForm);
    connect(form_, &ImportForm::nameChanged, this, [this] {
        if (ImportEntry* entry = shown()) {
            entry->choices.name = form_->choicesFrom(entry->choices).name;
        }
    });
    connect(&runner_, &ImportRunner::looked, this, &ImportPanel::takeLook);
    connect(take_, &QPushButton::clicked, this, &ImportPanel::takeIn);
    connect(alike_, &QPushButton::clicked, this, &ImportPanel::settleAllAlike);
    connect(remove, &QPushButton::clicked, this, &ImportPanel::removeShown);
    connect(back, &QPushButton::clicked, this, &ImportPanel::dismiss);
}

void ImportPanel::buildLists() {
    list_->setAccessibleName(tr("Files to take in"));
    list_->setHorizontalScrollBarPolicy(Qt::ScrollBarAlwaysOff);
    words_->setWordWrap(true);
    words_->setAlignment(Qt::AlignTop | Qt::AlignLeft);
    words_->setContentsMargins(8, 4, 8, 4);
    problem_->setWordWrap(true);
    problem_->setContentsMargins(11, 2, 11, 4);
    auto* left = new QSplitter(Qt::Vertical, this);
    left->addWidget(list_);
    left->addWidget(scrolled(words_, tr("What was understood")));
    auto* centre = new QSplitter(Qt::Vertical, this);
    centre->addWidget(table_);
    centre->addWidget(preview_);
    auto* columns = new QSplitter(Qt::Horizontal, this);
    columns->addWidget(left);
    columns->addWidget(centre);
    columns->addWidget(scrolled(form_, tr("What the file does not say")));
    columns->setStretchFactor(1, 1);
    columns->setSizes({280, 760, 330});
    left->setSizes({300, 400});
    centre->setSizes({320, 420});
    for (QSplitter* splitter : {left, centre, columns}) {
        splitter->setChildrenCollapsible(false);
    }
    body()->addWidget(problem_);
    body()->addWidget(columns, 1);
}

void ImportPanel::add(const QStringList& paths) {
    const int first = list_->count();
    for (const QString& path : paths) {
        ImportEntry entry;
        entry.id = ++lastId_;
        entry.path = path;
        entry.choices.name = QFileInfo(path).completeBaseName();
        entries_.push_back(std::move(entry));
        list_->addItem(listText(entries_.back()));
        ask(entries_.back());
    }
    select(first);
    list_->setFocus(Qt::OtherFocusReason);
}

void ImportPanel::select(int row) {
    list_->setCurrentRow(row);
    refreshShown();
}

ImportEntry* ImportPanel::shown() {
    const int row = list_->currentRow();
    return row >= 0 && row < std::ssize(entries_) ? &entries_[static_cast<std::size_t>(row)]
                                                  : nullptr;
}

void ImportPanel::ask(ImportEntry& entry) {
    entry.measuredOn = document_.shared();
    runner_.request(entry.id, entry.path, entry.choices, entry.measuredOn);
    refreshList();
}

void ImportPanel::takeLook(int id, const ImportLookPointer& look) {
    const auto entry = std::ranges::find(entries_, id, &ImportEntry::id);
    if (entry == entries_.end()) {
        return;
    }
    const bool turnsOutRecord = !entry->look && look->preview.time_record &&
                                entry->choices.holds == ImportChoices::Holds::response;
    entry->look = look;
    if (turnsOutRecord) {
        entry->choices.holds = ImportChoices::Holds::time_record;
        ask(*entry);
    }
    refreshList();
    if (&*entry == shown()) {
        refreshShown();
    }
}

void ImportPanel::takeForm() {
    if (ImportEntry* entry = shown()) {
        entry->choices = form_->choicesFrom(entry->choices);
        ask(*entry);
    }
}

void ImportPanel::takeColumn(int column, const QString& meaning, const QString& unit) {
    ImportEntry* entry = shown();
    if (entry == nullptr) {
        return;
    }
    std::vector<ColumnChoice>& columns = entry->choices.reading.columns;
    std::erase_if(columns, [column](const ColumnChoice& other) { return other.column == column; });
    columns.push_back({column, meaning.toStdString(), unit.toStdString()});
    ask(*entry);
}

void ImportPanel::removeShown() {
    const int row = list_->currentRow();
    if (shown() == nullptr) {
        return;
    }
    entries_.erase(entries_.begin() + row);
    delete list_->takeItem(row);
    if (entries_.empty()) {
        dismiss();
    }
    refreshList();
}

void ImportPanel::settleAllAlike() {
    const ImportEntry* pattern = shown();
    if (pattern == nullptr) {
        return;
    }
    const ImportChoices choices = pattern->choices;
    const int id = pattern->id;
    for (ImportEntry& entry : entries_) {
        if (entry.id != id) {
            const QString name = entry.choices.name;
            entry.choices = choices;
            entry.choices.name = name;
            ask(entry);
        }
    }
}

void ImportPanel::takeIn() {
    QString sentence;
    try {
        const QString folder = document_.filePath().isEmpty() ? QString() : document_.folder();
        AcceptedImports accepted =
            acceptImports(document_.project(), entries_, document_.folder(), folder);
        if (accepted.names.isEmpty()) {
            return;
        }
        const QString names = accepted.names.join(QStringLiteral(", "));
        sentence = tr("Taken in: %1.").arg(names);
        if (!accepted.written.isEmpty()) {
            sentence += QLatin1Char(' ') +
                        tr("Written: %1.").arg(accepted.written.join(QStringLiteral(", ")));
        }
        document_.apply(std::move(accepted.project), tr("Take in %1").arg(names));
    } catch (const std::runtime_error& error) {
        Q_EMIT failed(QString::fromUtf8(error.what()));
        return;
    }
    for (int row = static_cast<int>(entries_.size()) - 1; row >= 0; --row) {
        const ImportLookPointer& look = entries_[static_cast<std::size_t>(row)].look;
        if (look && look->plant) {
            entries_.erase(entries_.begin() + row);
            delete list_->takeItem(row);
        }
    }
    Q_EMIT taken(sentence);
    if (entries_.empty()) {
        dismiss();
    } else {
        refreshList();
        refreshShown();
    }
}

void ImportPanel::dismiss() {
    runner_.cancel();
    entries_.clear();
    list_->clear();
    Q_EMIT closed();
}

void ImportPanel::refreshList() {
    for (std::size_t i = 0; i < entries_.size() && static_cast<int>(i) < list_->count(); ++i) {
        list_->item(static_cast<int>(i))->setText(listText(entries_[i]));
    }
    const auto ready = std::ranges::count_if(
        entries_, [](const ImportEntry& entry) { return entry.look && entry.look->plant; });
    setNote(runner_.isBusy() ? tr("%1 of %2 ready, reading …").arg(ready).arg(entries_.size())
                             : tr("%1 of %2 ready").arg(ready).arg(entries_.size()));
    take_->setEnabled(ready > 0 && !runner_.isBusy());
    alike_->setEnabled(entries_.size() > 1);
    Q_EMIT refreshed();
}

void ImportPanel::refreshShown() {
    const ImportEntry* entry = shown();
    const ImportLook look = entry != nullptr && entry->look ? *entry->look : ImportLook();
    const ImportChoices choices = entry != nullptr ? entry->choices : ImportChoices();
    form_->setEnabled(entry != nullptr);
    table_->setLook(look, choices.holds);
    form_->setEntry(choices, look);
    preview_->setCurves(look.plant ? std::vector{previewCurve(*look.plant)}
                                   : std::vector<PreviewCurve>());
    refreshWords();
    Q_EMIT refreshed();
}

void ImportPanel::refreshWords() {
    const ImportEntry* entry = shown();
    const bool known = entry != nullptr && entry->look;
    problem_->setText(known ? entry->look->problem : QString());
    problem_->setVisible(!problem_->text().isEmpty());
    QStringList words = known ? entry->look->understood : QStringList();
    if (known) {
        for (const OpenChoice& choice : entry->look->preview.choices) {
            words << tr("To be settled: %1").arg(QString::fromStdString(choice.why));
        }
        if (needsOwnFile(entry->choices)) {
            words << tr("The plant will be written to a table of its own beside the project.");
        }
    }
    words_->setText(words.join(QLatin1Char('\n')));
}

void ImportPanel::keyPressEvent(QKeyEvent* event) {
    if (event->key() == Qt::Key_Escape) {
        dismiss();
        return;
    }
    PanelFrame::keyPressEvent(event);
}

} // namespace cornerwright
