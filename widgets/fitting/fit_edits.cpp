#include "widgets/fitting/fit_edits.h"

#include "widgets/figure_text.h"

#include <QCoreApplication>
#include <QStringList>

#include <algorithm>
#include <cmath>
#include <complex>

namespace cornerwright {

namespace {

QString tr(const char* text) {
    return QCoreApplication::translate("cornerwright", text);
}

QString rootsText(const ComplexVector& roots) {
    QStringList texts;
    for (const Complex root : roots) {
        if (root.imag() == 0.0) {
            texts << numberText(root.real());
        } else if (root.imag() > 0.0) {
            texts
                << QStringLiteral("%1 ± %2j").arg(numberText(root.real()), numberText(root.imag()));
        }
    }
    return texts.isEmpty() ? tr("none") : texts.join(QStringLiteral("; "));
}

} // namespace

std::optional<std::size_t> indexOfCase(const Project& project, const std::string& name) {
    const auto found = std::ranges::find(project.plant_cases, name, &PlantCase::name);
    if (found == project.plant_cases.end()) {
        return std::nullopt;
    }
    return static_cast<std::size_t>(found - project.plant_cases.begin());
}

std::shared_ptr<const MeasuredResponse> measuredResponseOf(const PlantCase& plantCase) {
    const auto* source = std::get_if<MeasurementSource>(&plantCase.source);
    return source == nullptr ? nullptr : source->response;
}

Project withFit(const Project& project, std::size_t index, const FitResult& fit) {
    Project next = project;
    std::get<MeasurementSource>(next.plant_cases.at(index).source).fit =
        FittedModel{fit.model, fit.misfit_db};
    return next;
}

PreviewCurve previewOfModel(const PlantModel& model, const MeasuredResponse& measured) {
    MeasuredResponse drawn;
    drawn.w_rad_s = measured.w_rad_s;
    for (const double w : measured.w_rad_s) {
        drawn.response.push_back(evaluate(model.roots, {0.0, w}) *
                                 std::polar(1.0, -w * model.dead_time_s));
    }
    PreviewCurve curve = previewCurve(drawn);
    curve.isModel = true;
    const PreviewCurve points = previewCurve(measured);
    if (!curve.degrees.empty()) {
        constexpr double turn = 360.0;
        const double shift =
            turn * std::round((points.degrees.front() - curve.degrees.front()) / turn);
        for (double& degrees : curve.degrees) {
            degrees += shift;
        }
    }
    return curve;
}

QString fitWords(const FitResult& fit) {
    QStringList words{
        tr("Order %1, misfit %2").arg(fit.order).arg(decibelText(fit.misfit_db)),
        tr("Dead time %1").arg(timeText(fit.model.dead_time_s)),
        tr("Poles (rad/s): %1").arg(rootsText(fit.model.roots.poles)),
        tr("Zeros (rad/s): %1").arg(rootsText(fit.model.roots.zeros)),
    };
    for (const std::string& note : fit.notes) {
        words << QString::fromStdString(note);
    }
    const auto unstable = std::ranges::count_if(
        fit.model.roots.poles, [](const Complex& pole) { return pole.real() > 0.0; });
    if (unstable > 0) {
        words << tr("%1 poles right of the axis: the case must declare as many unstable poles")
                     .arg(unstable);
    }
    return words.join(QLatin1Char('\n'));
}

} // namespace cornerwright
