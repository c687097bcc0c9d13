#include "widgets/design/run_row.h"

#include "widgets/parts/link_button.h"
#include "widgets/parts/text_label.h"

#include <QHBoxLayout>
#include <QProgressBar>

#include <utility>

namespace cornerwright {

namespace {
constexpr int barSteps = 1000;
}

RunRow::RunRow(const QString& startText, QWidget* parent)
    : QWidget(parent),
      start_(new LinkButton(startText, this)),
      cancel_(new LinkButton(tr("Cancel"), this)),
      bar_(new QProgressBar(this)),
      note_(new TextLabel(QString(), TextLabel::Kind::muted, this)) {
    auto* row = new QHBoxLayout(this);
    row->setContentsMargins(0, 0, 0, 0);
    row->addWidget(start_);
    row->addWidget(cancel_);
    row->addWidget(bar_, 1);
    row->addWidget(note_, 1);
    bar_->setRange(0, barSteps);
    bar_->setAccessibleName(tr("Progress"));
    note_->setWordWrap(true);
    showRunning(false);
    connect(start_, &LinkButton::clicked, this, &RunRow::startAsked);
    connect(cancel_, &LinkButton::clicked, &run_, &BackgroundRun::cancel);
    connect(&run_, &BackgroundRun::progressed, this,
            [this](double part) { bar_->setValue(qRound(barSteps * part)); });
    connect(&run_, &BackgroundRun::ended, this, [this] { showRunning(false); });
    connect(&run_, &BackgroundRun::failed, this, &RunRow::setProblem);
}

void RunRow::start(BackgroundRun::Task task) {
    bar_->setValue(0);
    setNote({});
    run_.start(std::move(task));
    showRunning(true);
}

void RunRow::showRunning(bool on) {
    start_->setEnabled(!on);
    cancel_->setVisible(on);
    bar_->setVisible(on);
    note_->setVisible(!on);
}

void RunRow::setNote(const QString& note) {
    note_->setKind(TextLabel::Kind::muted);
    note_->setText(note);
}

void RunRow::setProblem(const QString& problem) {
    note_->setKind(TextLabel::Kind::problem);
    note_->setText(QStringLiteral("✗ ") + problem);
}

QString RunRow::note() const {
    return note_->text();
}

} // namespace cornerwright
