#include "widgets/cases/case_facts.h"

#include "core/numerics/error.h"
#include "widgets/figure_text.h"

#include <QCoreApplication>

#include <algorithm>
#include <numbers>

namespace cornerwright {

namespace {

QString tr(const char* text) {
    return QCoreApplication::translate("cornerwright", text);
}

const QString separator = QStringLiteral(" · ");

QString measurementFact(const MeasurementSource& source) {
    if (!source.response) {
        return tr("%1 could not be loaded").arg(QString::fromStdString(source.file));
    }
    QStringList facts{tr("%1 points").arg(source.response->w_rad_s.size())};
    const std::vector<double>& coherence = source.response->coherence;
    if (!coherence.empty()) {
        facts << tr("coherence ≥ %1").arg(fixedText(*std::ranges::min_element(coherence), 2));
    }
    if (!source.fit) {
        facts << tr("no fit");
    }
    return facts.join(separator);
}

QString modelFact(const PlantSource& source) {
    try {
        const std::optional<PlantModel> model = model_of(source);
        if (!model) {
            return {};
        }
        QString fact = tr("model, order %1").arg(model->roots.poles.size());
        if (model->dead_time_s > 0.0) {
            fact += separator + tr("dead time %1").arg(timeText(model->dead_time_s));
        }
        return fact;
    } catch (const InputError& error) {
        return QString::fromUtf8(error.what());
    }
}

} // namespace

QString caseFact(const PlantCase& plantCase) {
    if (const auto* measurement = std::get_if<MeasurementSource>(&plantCase.source)) {
        return measurementFact(*measurement);
    }
    if (const auto* formula = std::get_if<FormulaSource>(&plantCase.source)) {
        return QString::fromStdString(formula->text);
    }
    return modelFact(plantCase.source);
}

bool isMeasured(const PlantCase& plantCase) {
    const auto* measurement = std::get_if<MeasurementSource>(&plantCase.source);
    return measurement != nullptr && measurement->response;
}

QString bindingFact(const Verdict& verdict, const std::string& caseName) {
    const auto binds =
        std::ranges::count_if(verdict.requirements, [&caseName](const RequirementResult& result) {
            return result.worst.state == State::unmet && result.worst.case_name == caseName;
        });
    switch (binds) {
    case 0:
        return {};
    case 1:
        return tr("binds 1 requirement");
    default:
        return tr("binds %1 requirements").arg(binds);
    }
}

QStringList shownCaseFacts(const Project& project, const PlantCase& plantCase,
                           const LoopFigures* figures) {
    QStringList facts;
    const auto* measurement = std::get_if<MeasurementSource>(&plantCase.source);
    if (measurement != nullptr && measurement->fit) {
        const FittedModel& fit = *measurement->fit;
        facts << tr("Fit: order %1, misfit %2, dead time %3")
                     .arg(fit.model.roots.poles.size())
                     .arg(decibelText(fit.misfit_db), timeText(fit.model.dead_time_s));
    } else if (measurement != nullptr) {
        facts << tr("No fit: locus and step are not determined");
    }
    if (!project.sampling || project.sampling->sample_period_s <= 0.0) {
        return facts;
    }
    const Sampling& sampling = *project.sampling;
    facts << tr("Sampled at %1, computation %2")
                 .arg(prefixedText(1.0 / sampling.sample_period_s, QStringLiteral("Hz")),
                      timeText(sampling.computation_delay_s));
    if (figures != nullptr && !figures->frequency.crossovers_rad_s.empty()) {
        // The hold costs half a sample, the computation its own time.
        const double lag = sampling.sample_period_s / 2.0 + sampling.computation_delay_s;
        const double w = figures->frequency.crossovers_rad_s.back();
        facts << tr("Costs %1 at the last crossover")
                     .arg(degreeText(w * lag * 180.0 / std::numbers::pi));
    }
    return facts;
}

} // namespace cornerwright
