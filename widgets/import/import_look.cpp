#include "widgets/import/import_look.h"

#include "core/engine/loop_without_plant.h"
#include "core/numerics/number_text.h"
#include "core/project/load_measurement.h"
#include "widgets/figure_text.h"

#include <QCoreApplication>
#include <QFileInfo>

#include <algorithm>
#include <cmath>
#include <filesystem>

namespace cornerwright {

namespace {

QString tr(const char* text) {
    return QCoreApplication::translate("cornerwright", text);
}

std::filesystem::path toPath(const QString& path) {
    return std::filesystem::path(path.toStdU16String());
}

QString toText(const std::string& text) {
    return QString::fromStdString(text);
}

QStringList understoodOf(const ReadResult& read) {
    QStringList told;
    for (const ColumnInfo& column : read.columns) {
        const QString unit = column.unit.empty() ? QString() : tr(", %1").arg(toText(column.unit));
        told << (column.column > 0 ? tr("Column %1 “%2”: %3%4")
                                         .arg(QString::number(column.column),
                                              toText(column.heading), toText(column.meaning), unit)
                                   : toText(column.meaning) + unit);
    }
    told << tr("%1 rows used, %2 left out").arg(read.rows).arg(read.skipped.size());
    for (const SkippedRow& row : read.skipped) {
        constexpr qsizetype longest = 12;
        if (told.size() > longest + std::ssize(read.columns)) {
            told << tr("… and more");
            break;
        }
        told << tr("Line %1 left out: %2").arg(row.line).arg(toText(row.why));
    }
    for (const std::string& warning : read.warnings) {
        told << toText(warning);
    }
    return told;
}

/// The response that the file gives before it is turned into a plant.
std::optional<MeasuredResponse> responseOf(const QString& path, const ImportChoices& choices,
                                           const std::function<bool()>& proceed, ImportLook& look) {
    ReadOptions reading = choices.reading;
    reading.progress = [&proceed](double) { return proceed(); };
    look.preview = preview_measurement(toPath(path), reading);
    if (choices.holds == ImportChoices::Holds::response) {
        look.isOpen = !look.preview.choices.empty() || look.preview.time_record;
        if (look.preview.problem) {
            throw *look.preview.problem;
        }
        if (!look.preview.result || look.preview.result->cancelled) {
            return std::nullopt;
        }
        look.understood = understoodOf(*look.preview.result);
        look.reading = std::make_shared<const ReadingRecord>(record_of(*look.preview.result));
        return look.preview.result->response;
    }
    for (const std::string& name : time_record_columns(toPath(path))) {
        look.channels << toText(name);
    }
    if (choices.record.excitation.empty() || choices.record.response.empty()) {
        look.isOpen = true;
        look.problem = tr("Choose the column of the excitation and that of the response.");
        return std::nullopt;
    }
    RecordOptions options = choices.record;
    options.progress = reading.progress;
    const TimeRecord record = read_time_record(toPath(path), options);
    if (record.cancelled) {
        return std::nullopt;
    }
    Estimate estimate = estimate_response(record, choices.estimate);
    look.understood << tr("Excitation “%1”, response “%2”")
                           .arg(toText(record.excitation_name), toText(record.response_name))
                    << tr("%1 samples, one every %2")
                           .arg(record.excitation.size())
                           .arg(timeText(record.sample_period_s))
                    << tr("%1 frequencies, %2 averages")
                           .arg(estimate.response.w_rad_s.size())
                           .arg(estimate.response.averages);
    for (const std::string& warning : estimate.warnings) {
        look.understood << toText(warning);
    }
    return edited(std::move(estimate.response), choices.reading);
}

/// How much of a measurement is more noise than response.
void tellDoubtful(const MeasuredResponse& response, ImportLook& look) {
    constexpr double doubtful = 0.5;
    const auto count = std::ranges::count_if(response.coherence,
                                             [](double coherence) { return coherence < doubtful; });
    if (count > 0) {
        look.understood << tr("%1 points have a coherence below %2").arg(count).arg(doubtful);
    }
}

QString quantityRemark(MeasuredQuantity quantity) {
    return quantity == MeasuredQuantity::loop_gain
               ? tr("plant P = L/(C H) from the measured loop gain L")
               : tr("plant P = T/(C H (1 - T)) from the measured closed loop T");
}

QString compensatorRemark(const Project& project) {
    const RootForm roots = roots_of(project.compensator);
    const auto list = [](const ComplexVector& values) {
        QStringList texts;
        for (const Complex value : values) {
            texts << toText(number_text(value.real()) + (value.imag() < 0.0 ? " - " : " + ") +
                            number_text(std::abs(value.imag())) + "j");
        }
        return texts.join(QStringLiteral(", "));
    };
    return tr("compensator C: gain %1; zeros (rad/s): %2; poles (rad/s): %3; H: hold and delay of "
              "the design loop")
        .arg(toText(number_text(roots.gain)), list(roots.zeros), list(roots.poles));
}

} // namespace

ImportLook lookAt(const QString& path, const ImportChoices& choices, const Project& project,
                  const std::function<bool()>& proceed) {
    ImportLook look;
    try {
        std::optional<MeasuredResponse> response = responseOf(path, choices, proceed, look);
        if (response && choices.leastCoherence > 0.0) {
            response = with_least_coherence(*response, choices.leastCoherence);
        }
        if (response) {
            tellDoubtful(*response, look);
            const ComplexVector rest = loop_without_plant(project, response->w_rad_s);
            look.plant = std::make_shared<const MeasuredResponse>(
                plant_from(choices.quantity, std::move(*response), rest));
            look.sha256 = sha256_of_file(toPath(path));
            look.isOpen = false;
        }
    } catch (const InputError& error) {
        look.problem = QString::fromUtf8(error.what());
    }
    return look;
}

QStringList conversionRemarks(const QString& path, const ImportChoices& choices,
                              const ImportLook& look, const Project& project) {
    const ReadOptions& reading = choices.reading;
    QStringList remarks{
        tr("taken from %1, SHA-256 %2").arg(QFileInfo(path).fileName(), toText(look.sha256))};
    for (const ColumnChoice& column : reading.columns) {
        remarks << tr("column %1 taken as %2 %3")
                       .arg(QString::number(column.column), toText(column.meaning),
                            toText(column.unit))
                       .trimmed();
    }
    if (!reading.parameter.empty()) {
        remarks << tr("network parameter %1").arg(toText(reading.parameter));
    }
    remarks << look.understood;
    if (choices.leastCoherence > 0.0) {
        remarks << tr("points with a coherence below %1 left out").arg(choices.leastCoherence);
    }
    if (reading.flip_sign) {
        remarks << tr("sign turned");
    }
    if (reading.remove_delay_s != 0.0) {
        remarks << tr("delay of %1 s taken out").arg(toText(number_text(reading.remove_delay_s)));
    }
    if (choices.quantity != MeasuredQuantity::plant) {
        remarks << quantityRemark(choices.quantity) << compensatorRemark(project);
    }
    return remarks;
}

} // namespace cornerwright
