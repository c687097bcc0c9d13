#include "widgets/handover/study_view.h"

#include "widgets/figure_text.h"
#include "widgets/parts/text_label.h"
#include "widgets/theme.h"

#include <QHeaderView>
#include <QScrollBar>
#include <QTableWidget>
#include <QVBoxLayout>

#include <cmath>

namespace cornerwright {

namespace {

QString figureWords(const Figure& figure) {
    return figure.is_value() ? numberText(figure.value())
                             : figureText(figure, MeasureUnit::plain, true);
}

QString structureText(Structure structure) {
    switch (structure) {
    case Structure::direct_form_1:
        return StudyView::tr("direct form 1");
    case Structure::direct_form_2_transposed:
        return StudyView::tr("direct form 2 transposed");
    case Structure::delta:
        break;
    }
    return StudyView::tr("delta operator");
}

QString poleSentence(const RealisationStudy& study) {
    QStringList parts;
    for (const PoleError& error : study.pole_errors) {
        const Figure& relative = error.largest_relative_error;
        constexpr double percent = 100.0;
        parts << QStringLiteral("%1 %2").arg(
            structureText(error.structure),
            relative.is_value() ? numberText(percent * relative.value(), 2) + QStringLiteral(" %")
                                : StudyView::tr("loses a pole"));
    }
    const auto best = best_structure(study.pole_errors);
    return best ? StudyView::tr(
                      "Error of the poles in this number format: %1. They are kept best by: %2.")
                      .arg(parts.join(QStringLiteral(", ")), structureText(best->structure))
                : QString();
}

QString bitsSentence(const FractionBits& bits) {
    return bits.smallest
               ? StudyView::tr(
                     "Words of %1 bits: at least %2 fraction bits meet every requirement.")
                     .arg(bits.word_bits)
                     .arg(*bits.smallest)
               : StudyView::tr("Words of %1 bits: %2.")
                     .arg(bits.word_bits)
                     .arg(QString::fromStdString(bits.reason));
}

QString noiseSentence(const RealisationStudy& study) {
    if (!study.noise || !study.zero_input_cycle) {
        return {};
    }
    const ZeroInputCycle& cycle = *study.zero_input_cycle;
    QString words = StudyView::tr("Rounding noise at the output %1 rms.")
                        .arg(numberText(study.noise->simulated_rms, 2));
    if (!cycle.amplitude.is_value()) {
        words += StudyView::tr(" Zero-input limit cycle: not determined, %1.")
                     .arg(QString::fromStdString(cycle.amplitude.reason()));
    } else if (cycle.period == 0) {
        words += StudyView::tr(" No zero-input limit cycle found.");
    } else {
        words += StudyView::tr(" Zero-input limit cycle of %1, period %2 samples.")
                     .arg(numberText(cycle.amplitude.value(), 2))
                     .arg(cycle.period);
    }
    if (study.smallest_integrated_error.is_determined()) {
        words += StudyView::tr(" Smallest error still integrated: %1.")
                     .arg(figureWords(study.smallest_integrated_error));
    }
    return words;
}

QString headroomSentence(const RealisationStudy& study) {
    const SignalBound* tightest = nullptr;
    for (const SignalBound& bound : study.signal_bounds) {
        if (bound.headroom_bits.is_value() &&
            (tightest == nullptr ||
             bound.headroom_bits.value() < tightest->headroom_bits.value())) {
            tightest = &bound;
        }
    }
    return tightest == nullptr
               ? QString()
               : StudyView::tr("Least headroom for a full-scale input: %1 bits (%2, L1 bound %3).")
                     .arg(numberText(tightest->headroom_bits.value(), 2),
                          QString::fromStdString(tightest->signal), figureWords(tightest->l1));
}

} // namespace

QString methodText(Method method) {
    switch (method) {
    case Method::tustin:
        return StudyView::tr("Tustin");
    case Method::tustin_at_corners:
        return StudyView::tr("Tustin, exact at each corner");
    case Method::tustin_at:
        return StudyView::tr("Tustin, exact at one frequency");
    case Method::matched_roots:
        return StudyView::tr("matched roots");
    case Method::step_invariant:
        return StudyView::tr("step invariant");
    case Method::ramp_invariant:
        break;
    }
    return StudyView::tr("ramp invariant");
}

QString headroomText(const Judgement& judgement, const Requirement& requirement) {
    const MeasureUnit unit = unit_of(requirement.measure);
    const Figure& headroom = judgement.headroom;
    if (!headroom.is_value()) {
        return figureText(headroom, MeasureUnit::plain, true);
    }
    const double value = headroom.value();
    const QString sign = value > 0.0 ? QStringLiteral("+") : QString();
    switch (unit) {
    case MeasureUnit::deg:
        return sign + degreeText(value);
    case MeasureUnit::db:
        return sign + decibelText(value);
    default:
        break;
    }
    if (requirement.at_least.value_or(1.0) == 0.0 || requirement.at_most.value_or(1.0) == 0.0) {
        return sign + valueText(value, unit, true); // no ratio to a limit of 0
    }
    constexpr double percent = 100.0; // of the limit: the headroom is a logarithm
    return sign + fixedText(percent * std::expm1(value), 0) + QStringLiteral(" %");
}

StudyView::StudyView(QWidget* parent)
    : QWidget(parent),
      head_(new TextLabel(QString(), TextLabel::Kind::muted, this)),
      table_(new QTableWidget(this)),
      sentences_(new TextLabel(QString(), TextLabel::Kind::muted, this)) {
    auto* layout = new QVBoxLayout(this);
    layout->setContentsMargins(0, 6, 0, 0);
    layout->addWidget(head_);
    layout->addWidget(table_);
    layout->addWidget(sentences_);
    head_->setWordWrap(true);
    sentences_->setWordWrap(true);
    table_->setAccessibleName(tr("Headroom of every requirement with each method"));
    table_->setFrameShape(QFrame::NoFrame);
    table_->setShowGrid(false);
    table_->setEditTriggers(QAbstractItemView::NoEditTriggers);
    table_->setSelectionMode(QAbstractItemView::NoSelection);
    table_->setTabKeyNavigation(false);
    table_->setVerticalScrollBarPolicy(Qt::ScrollBarAlwaysOff);
    table_->verticalHeader()->hide();
    table_->horizontalHeader()->setSectionResizeMode(QHeaderView::ResizeToContents);
    connect(table_, &QTableWidget::cellActivated, this, [this](int row, int) {
        const auto index = static_cast<std::size_t>(row);
        if (study_ && index < study_->methods.size()) {
            Q_EMIT methodChosen(study_->methods[index].method);
        }
    });
    setVisible(false);
}

void StudyView::setPending() {
    if (study_) {
        head_->setText(tr("What each method costs on the realised loops; being worked out anew …"));
    }
}

void StudyView::setStudy(std::shared_ptr<const Project> project,
                         std::shared_ptr<const RealisationStudy> study) {
    project_ = std::move(project);
    study_ = std::move(study);
    refresh();
}

void StudyView::setShowsHertz(bool hertz) {
    hertz_ = hertz;
    refresh();
}

void StudyView::refresh() {
    setVisible(study_ && !study_->methods.empty());
    if (!study_ || !project_) {
        return;
    }
    head_->setText(tr("What each method costs on the realised loops, the worst case of each: value "
                      "and headroom. Enter on a row takes the method."));
    fillTable();
    QStringList sentences;
    for (const FractionBits& bits : study_->fraction_bits) {
        sentences << bitsSentence(bits);
    }
    sentences << poleSentence(*study_) << headroomSentence(*study_) << noiseSentence(*study_);
    sentences.removeAll(QString());
    sentences_->setText(sentences.join(QLatin1Char('\n')));
}

void StudyView::fillTable() {
    const Theme& theme = Theme::of(palette());
    const auto& requirements = project_->requirements;
    QStringList heads{tr("method")};
    for (const Requirement& requirement : requirements) {
        heads << requirementText(requirement, hertz_) + QLatin1Char('\n') +
                     limitText(requirement, hertz_);
    }
    table_->clear();
    table_->setRowCount(static_cast<int>(study_->methods.size()));
    table_->setColumnCount(static_cast<int>(heads.size()));
    table_->setHorizontalHeaderLabels(heads);
    for (int row = 0; row < table_->rowCount(); ++row) {
        const MethodOutcome& outcome = study_->methods[static_cast<std::size_t>(row)];
        auto* name = new QTableWidgetItem(methodText(outcome.method));
        const bool chosen =
            project_->realisation && project_->realisation->method == outcome.method;
        name->setFont(fontOf(chosen ? FontRole::strong : FontRole::body));
        if (!outcome.problem.empty()) {
            name->setText(tr("%1: cannot be").arg(name->text()));
            name->setToolTip(QString::fromStdString(outcome.problem));
            name->setForeground(theme.colour(ColourRole::muted));
        }
        table_->setItem(row, 0, name);
        for (std::size_t i = 0; i < outcome.worst.size() && i < requirements.size(); ++i) {
            const Judgement& judgement = outcome.worst[i];
            const MeasureUnit unit = unit_of(requirements[i].measure);
            auto* item = new QTableWidgetItem(QStringLiteral("%1 %2 (%3)")
                                                  .arg(markOf(judgement.state),
                                                       figureText(judgement.value, unit, hertz_),
                                                       headroomText(judgement, requirements[i])));
            item->setForeground(theme.state(judgement.state));
            item->setToolTip(QString::fromStdString(judgement.reason.empty() ? judgement.case_name
                                                                             : judgement.reason));
            table_->setItem(row, static_cast<int>(i) + 1, item);
        }
    }
    table_->resizeRowsToContents();
    table_->setFixedHeight(table_->horizontalHeader()->sizeHint().height() +
                           table_->verticalHeader()->length() +
                           table_->horizontalScrollBar()->sizeHint().height());
}

} // namespace cornerwright
