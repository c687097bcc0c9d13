#include "widgets/handover/export_row.h"

#include "widgets/handover/caution_text.h"
#include "widgets/parts/link_button.h"
#include "widgets/parts/text_label.h"

#include <QGridLayout>
#include <QHBoxLayout>
#include <QLineEdit>
#include <QVBoxLayout>

#include <algorithm>

namespace cornerwright {

namespace {

/// What every file will say too; nothing where all is met.
QString warningOf(const Verdict& verdict) {
    const auto count = [&verdict](State state) {
        return std::ranges::count_if(
            verdict.requirements,
            [state](const RequirementResult& result) { return result.worst.state == state; });
    };
    if (verdict.requirements.empty()) {
        return ExportRow::tr("? No requirement is stated; nothing was judged, and every file will "
                             "say so.");
    }
    if (const auto unmet = count(State::unmet); unmet > 0) {
        return ExportRow::tr("✗ %1 of the requirements are unmet; every file will say so.")
            .arg(unmet);
    }
    if (const auto open = count(State::undetermined); open > 0) {
        return ExportRow::tr("? %1 of the requirements are not determined; every file will say so.")
            .arg(open);
    }
    return {};
}

} // namespace

ExportRow::ExportRow(QWidget* parent)
    : QWidget(parent),
      name_(new QLineEdit(QStringLiteral("compensator"), this)),
      warning_(new TextLabel(QString(), TextLabel::Kind::problem, this)) {
    auto* whole = new QVBoxLayout(this);
    whole->setContentsMargins(0, 6, 0, 0);
    auto* names = new QHBoxLayout;
    names->addWidget(new TextLabel(tr("Name in the files"), TextLabel::Kind::muted, this));
    names->addWidget(name_, 1);
    name_->setAccessibleName(tr("Name in the files"));
    auto* buttons = new QGridLayout;
    buttons->setSpacing(0);
    constexpr int perRow = 3;
    const std::pair<QString, HandoverForm> forms[] = {
        {tr("C99"), HandoverForm::c99},
        {tr("Structured text"), HandoverForm::structured_text},
        {tr("JSON"), HandoverForm::json},
        {tr("CSV"), HandoverForm::csv},
    };
    for (const auto& [text, form] : forms) {
        auto* button = new LinkButton(text, this);
        button->setAccessibleName(tr("Hand over as %1").arg(text));
        connect(button, &LinkButton::clicked, this,
                [this, form = form] { Q_EMIT exportAsked(form, name()); });
        const auto place = static_cast<int>(exports_.size());
        buttons->addWidget(button, place / perRow, place % perRow, Qt::AlignLeft);
        exports_.push_back(button);
    }
    auto* report = new LinkButton(tr("Report"), this);
    report->setAccessibleName(tr("Write the review report"));
    connect(report, &LinkButton::clicked, this, &ExportRow::reportAsked);
    const auto last = static_cast<int>(exports_.size());
    buttons->addWidget(report, last / perRow, last % perRow, Qt::AlignLeft);
    buttons->setColumnStretch(perRow, 1);
    auto* caution = new TextLabel(QString(), TextLabel::Kind::muted, this);
    caution->setText(cautionSentences().join(QLatin1Char(' ')));
    caution->setWordWrap(true);
    warning_->setWordWrap(true);
    whole->addLayout(names);
    whole->addLayout(buttons);
    whole->addWidget(warning_);
    whole->addWidget(caution);
    setAssessment(nullptr);
}

QString ExportRow::name() const {
    return name_->text().trimmed();
}

void ExportRow::setAssessment(const Assessment* assessment) {
    for (QWidget* button : exports_) {
        button->setEnabled(assessment != nullptr && assessment->equation.has_value());
    }
    warning_->setText(assessment == nullptr ? QString() : warningOf(assessment->verdict));
    warning_->setVisible(!warning_->text().isEmpty());
}

} // namespace cornerwright
