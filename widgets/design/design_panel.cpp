#include "widgets/design/design_panel.h"

#include "core/engine/placement_problem.h"
#include "widgets/design/verdict_change.h"
#include "widgets/document/document.h"
#include "widgets/parts/link_button.h"
#include "widgets/parts/quantity_field.h"
#include "widgets/parts/text_label.h"
#include "widgets/theme.h"
#include "widgets/view_state.h"

#include <QComboBox>
#include <QFormLayout>
#include <QKeyEvent>
#include <QPainter>
#include <QShortcut>
#include <QVBoxLayout>

#include <exception>

namespace cornerwright {

namespace {

constexpr double cornerRadius = 6.0;

SectionProposal workedOut(const DesignWish& wish, const Project& project) {
    try {
        return proposalFor(wish, placement_problem_of(project));
    } catch (const std::exception& error) {
        return {false, project.compensator, {}, {error.what()}};
    }
}

} // namespace

DesignPanel::DesignPanel(Document& document, ViewState& viewState, QWidget* parent)
    : QFrame(parent),
      document_(document),
      viewState_(viewState),
      name_(new TextLabel(QString(), TextLabel::Kind::strong, this)),
      form_(new QFormLayout),
      words_(new TextLabel(QString(), TextLabel::Kind::muted, this)),
      changes_(new TextLabel(QString(), TextLabel::Kind::body, this)),
      problem_(new TextLabel(QString(), TextLabel::Kind::problem, this)),
      take_(new LinkButton(tr("Take"), this)) {
    auto* whole = new QVBoxLayout(this);
    whole->setContentsMargins(10, 6, 10, 6);
    whole->setSpacing(4);
    whole->addWidget(name_);
    form_->setContentsMargins(0, 0, 0, 0);
    form_->setRowWrapPolicy(QFormLayout::WrapLongRows);
    whole->addLayout(form_);
    for (TextLabel* label : {problem_, words_, changes_}) {
        label->setWordWrap(true);
        label->setTextInteractionFlags(Qt::TextSelectableByMouse);
        whole->addWidget(label);
    }
    auto* leaveButton = new LinkButton(tr("Leave"), this);
    take_->setToolTip(tr("Keep these sections as one step (Ctrl+Enter)"));
    leaveButton->setToolTip(tr("Put everything back (Escape)"));
    auto* buttons = new QHBoxLayout;
    buttons->addStretch(1);
    buttons->addWidget(take_);
    buttons->addWidget(leaveButton);
    whole->addLayout(buttons);
    setAccessibleName(tr("Section design"));
    setFocusPolicy(Qt::TabFocus);
    hide();
    for (const int key : {Qt::Key_Return, Qt::Key_Enter}) {
        auto* shortcut = new QShortcut(QKeySequence(Qt::CTRL | key), this);
        shortcut->setContext(Qt::WidgetWithChildrenShortcut);
        connect(shortcut, &QShortcut::activated, this, &DesignPanel::take);
    }

    connect(take_, &LinkButton::clicked, this, &DesignPanel::take);
    connect(leaveButton, &LinkButton::clicked, this, &DesignPanel::leave);
    connect(&document_, &Document::projectReplaced, this, &DesignPanel::close);
    connect(&document_, &Document::dragBegan, this, &DesignPanel::noteForeignDrag);
    connect(&document_, &Document::dragEnded, this, &DesignPanel::noteForeignDrag);
    // What the document is going to be stands only when its present change is through.
    connect(&document_, &Document::dragEnded, this, &DesignPanel::followDocument,
            Qt::QueuedConnection);
    connect(&document_, &Document::projectChanged, this, &DesignPanel::followDocument,
            Qt::QueuedConnection);
    connect(&viewState_, &ViewState::unitChanged, this, [this] {
        for (QuantityField* field : fields_) {
            field->setShowsHertz(viewState_.showsHertz());
        }
    });
}

void DesignPanel::begin(DesignKind kind) {
    endPreview();
    base_ = document_.shared();
    wish_ = firstWish(kind, *base_, content_.assessment.get());
    open_ = true;
    interrupted_ = false;
    name_->setText(nameOf(kind));
    buildForm();
    QFrame::show();
    if (!fields_.empty()) {
        fields_.front()->setFocus(Qt::OtherFocusReason);
    }
    request();
}

void DesignPanel::buildForm() {
    while (form_->rowCount() > 0) {
        form_->removeRow(0);
    }
    fields_.clear();
    for (const WishChoice& part : wishChoicesOf(wish_)) {
        addChoice(part);
    }
    for (const WishField& part : wishFieldsOf(wish_)) {
        addField(part);
    }
}

void DesignPanel::addField(const WishField& part) {
    auto* field = new QuantityField(part.kind, this);
    field->setAccessibleName(part.label);
    field->setMayBeEmpty(part.mayBeEmpty);
    field->setShowsHertz(viewState_.showsHertz());
    field->setValue(part.read(wish_));
    connect(field, &QuantityField::valueEntered, this, [this, part](std::optional<double> value) {
        part.write(wish_, value);
        request();
    });
    connect(field, &QuantityField::problemChanged, problem_, [this](const QString& problem) {
        problem_->setText(problem.isEmpty() ? problem : QStringLiteral("✗ ") + problem);
    });
    form_->addRow(new TextLabel(part.label, TextLabel::Kind::muted, this), field);
    fields_.push_back(field);
}

void DesignPanel::addChoice(const WishChoice& part) {
    auto* box = new QComboBox(this);
    box->addItems(part.options);
    box->setCurrentIndex(part.read(wish_));
    box->setAccessibleName(part.label);
    // The form may be built anew by the choice, so that comes after the box's own signal.
    connect(
        box, &QComboBox::activated, this,
        [this, part](int index) {
            part.write(wish_, index);
            buildForm();
            request();
        },
        Qt::QueuedConnection);
    form_->addRow(new TextLabel(part.label, TextLabel::Kind::muted, this), box);
}

void DesignPanel::setWish(const DesignWish& wish) {
    wish_ = wish;
    name_->setText(nameOf(wish.kind));
    buildForm();
    request();
}

void DesignPanel::request() {
    if (!open_) {
        return;
    }
    words_->setText(tr("Working it out …"));
    changes_->clear();
    take_->setEnabled(false);
    worker_.request([this, wish = wish_, project = base_] {
        const SectionProposal proposal = workedOut(wish, *project);
        return [this, proposal] { show(proposal); };
    });
}

void DesignPanel::show(const SectionProposal& proposal) {
    if (!open_ || (document_.isDragging() && !previewing_)) {
        return;
    }
    proposal_ = proposal;
    QStringList sentences;
    for (const std::string& sentence : proposal.words) {
        sentences << QString::fromStdString(sentence);
    }
    const QString mark = proposal.possible ? QString() : QStringLiteral("✗ ");
    words_->setText(mark + sentences.join(QLatin1Char('\n')));
    words_->setKind(proposal.possible ? TextLabel::Kind::muted : TextLabel::Kind::problem);
    take_->setEnabled(proposal.possible);
    proposal.possible ? preview() : endPreview();
    Q_EMIT changed();
}

void DesignPanel::preview() {
    auto proposed = std::make_shared<Project>(*base_);
    proposed->compensator = proposal_.compensator;
    ownChange_ = true;
    if (!previewing_) {
        document_.beginDrag(nameOf(wish_.kind));
        previewing_ = true;
    }
    document_.previewDrag(std::move(proposed));
    ownChange_ = false;
}

void DesignPanel::endPreview() {
    if (previewing_) {
        ownChange_ = true;
        previewing_ = false;
        document_.cancelDrag();
        ownChange_ = false;
    }
    changes_->clear();
}

void DesignPanel::take() {
    for (QuantityField* field : fields_) {
        field->take(); // what is typed and not yet entered counts
    }
    if (!open_ || worker_.isBusy() || !proposal_.possible || !previewing_) {
        return;
    }
    ownChange_ = true;
    previewing_ = false;
    document_.commitDrag();
    ownChange_ = false;
    if (!proposal_.added.empty()) {
        viewState_.setSelectedSection(proposal_.added.front());
    }
    close();
}

void DesignPanel::leave() {
    endPreview();
    close();
}

void DesignPanel::close() {
    if (!open_) {
        return;
    }
    open_ = false;
    previewing_ = false;
    worker_.cancel();
    proposal_ = {};
    hide();
    Q_EMIT changed();
}

void DesignPanel::noteForeignDrag() {
    if (previewing_ && !ownChange_) {
        previewing_ = false;
        interrupted_ = true;
    }
}

void DesignPanel::followDocument() {
    if (!open_ || previewing_ || document_.isDragging()) {
        return;
    }
    const bool isUndone = interrupted_ && *document_.shared() == *base_;
    interrupted_ = false;
    if (isUndone) {
        close();
    } else if (!(*document_.shared() == *base_)) {
        base_ = document_.shared();
        request();
    }
}

void DesignPanel::setContent(const PaneContent& content) {
    content_ = content;
    if (open_ && previewing_ && content.ghost && content.assessment && content.project &&
        content.project->compensator == proposal_.compensator) {
        changes_->setText(
            changesOf(content.ghost->verdict, content.assessment->verdict, viewState_.showsHertz())
                .join(QLatin1Char('\n')));
    }
}

QString DesignPanel::words() const {
    return words_->text();
}

void DesignPanel::keyPressEvent(QKeyEvent* event) {
    if (event->key() == Qt::Key_Escape) {
        leave();
    } else {
        QFrame::keyPressEvent(event);
    }
}

void DesignPanel::paintEvent(QPaintEvent*) {
    const Theme& theme = Theme::of(palette());
    QPainter painter(this);
    painter.setRenderHint(QPainter::Antialiasing);
    painter.setPen(QPen(theme.colour(ColourRole::accent), 1.5));
    painter.setBrush(theme.colour(ColourRole::pane));
    painter.drawRoundedRect(QRectF(rect()).adjusted(1.0, 1.0, -1.0, -1.0), cornerRadius,
                            cornerRadius);
}

} // namespace cornerwright
