#include "widgets/panes/measurement_words.h"

#include "widgets/figure_text.h"

#include <QCoreApplication>

#include <algorithm>

namespace cornerwright {

namespace {

constexpr std::size_t most_warnings = 4;

class MeasurementWords {
    Q_DECLARE_TR_FUNCTIONS(MeasurementWords)
};

void addReading(QStringList& words, const ReadingRecord& reading) {
    QString rows = MeasurementWords::tr("%1 rows gave points").arg(reading.rows);
    if (reading.skipped == 0)
        rows += MeasurementWords::tr(", none was skipped.");
    else
        rows += MeasurementWords::tr(", %1 skipped, the first in line %2: %3.")
                    .arg(reading.skipped)
                    .arg(reading.first_skipped_line)
                    .arg(QString::fromStdString(reading.first_skipped_why));
    words << rows;
    QStringList columns;
    for (const std::string& column : reading.columns)
        columns << QString::fromStdString(column);
    if (!columns.isEmpty())
        words << MeasurementWords::tr("Columns: %1.").arg(columns.join(QStringLiteral("; ")));
    const std::size_t told = std::min(reading.warnings.size(), most_warnings);
    for (std::size_t i = 0; i < told; ++i)
        words << QString::fromStdString(reading.warnings[i]);
    if (told < reading.warnings.size())
        words << MeasurementWords::tr("%1 more remarks of the reader.")
                     .arg(reading.warnings.size() - told);
}

} // namespace

QStringList measurementWords(const PlantCase& plantCase) {
    const auto* source = std::get_if<MeasurementSource>(&plantCase.source);
    if (source == nullptr)
        return {MeasurementWords::tr("This case is a model: nothing of it was measured.")};
    QStringList words{QString::fromStdString(source->file)};
    if (!source->response) {
        words << MeasurementWords::tr("The file could not be read.");
        return words;
    }
    if (source->reading)
        addReading(words, *source->reading);
    const bool hasCoherence = !source->response->coherence.empty();
    if (!hasCoherence)
        words << MeasurementWords::tr(
            "The file holds no coherence, so the random error is not known.");
    else if (source->response->averages <= 0.0)
        words << MeasurementWords::tr(
            "The file does not say how many averages were taken, so the random error is "
            "not known.");
    else
        words
            << MeasurementWords::tr("%1 averages.").arg(numberText(source->response->averages, 3));
    words << (source->fit ? MeasurementWords::tr("Fit of order %1, misfit %2.")
                                .arg(source->fit->model.roots.poles.size())
                                .arg(decibelText(source->fit->misfit_db))
                          : MeasurementWords::tr("No model is fitted."));
    return words;
}

} // namespace cornerwright
