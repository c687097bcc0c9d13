#pragma once

#include "core/measurement/frequency_estimate.h"
#include "core/measurement/read_measurement.h"
#include "core/measurement/response_edits.h"
#include "core/measurement/time_record.h"

#include <QString>

namespace cornerwright {

/// Everything that a person settles about one measurement file before it becomes a plant case.
struct ImportChoices {
    enum class Holds { response, time_record };

    QString name; ///< of the plant case
    Holds holds = Holds::response;
    ReadOptions reading;         ///< columns, units, parameter; sign and delay for records too
    RecordOptions record;        ///< channels and rate of a time record
    EstimateOptions estimate;    ///< how a response is made of a time record
    double leastCoherence = 0.0; ///< points below are left out; 0: none
    MeasuredQuantity quantity = MeasuredQuantity::plant;
    int integrators = 0;
    int unstablePoles = 0;
};

/// Whether the file, read with nothing settled, already gives the plant: then the project can name
/// the file itself. Otherwise the plant is written to a file of its own.
inline bool needsOwnFile(const ImportChoices& choices) {
    const ReadOptions& reading = choices.reading;
    return choices.holds == ImportChoices::Holds::time_record ||
           choices.quantity != MeasuredQuantity::plant || !reading.columns.empty() ||
           !reading.parameter.empty() || reading.flip_sign || reading.remove_delay_s != 0.0 ||
           choices.leastCoherence > 0.0;
}

} // namespace cornerwright
