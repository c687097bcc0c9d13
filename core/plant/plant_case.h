#pragma once

#include "core/numerics/root_form.h"
#include "core/response/measured_response.h"

#include <cstddef>
#include <memory>
#include <optional>
#include <string>
#include <variant>
#include <vector>

namespace cornerwright {

/// P(s) = roots(s) * exp(-s dead_time).
struct PlantModel {
    RootForm roots;
    double dead_time_s = 0.0;

    bool operator==(const PlantModel&) const = default;
};

/// A plant written as algebra in s, kept as the user typed it.
struct FormulaSource {
    std::string text;
    bool operator==(const FormulaSource&) const = default;
};

/// A plant given by its roots.
struct RootsSource {
    PlantModel model;
    bool operator==(const RootsSource&) const = default;
};

/// A plant given by coefficients, highest power first.
struct CoefficientsSource {
    std::vector<double> numerator;
    std::vector<double> denominator;
    double dead_time_s = 0.0;
    bool operator==(const CoefficientsSource&) const = default;
};

/// A model fitted to a measurement, used for its closed-loop poles, locus and step.
struct FittedModel {
    PlantModel model;
    double misfit_db = 0.0;
    bool operator==(const FittedModel&) const = default;
};

/// What was found in a measurement file when it was read.
struct ReadingRecord {
    std::size_t rows = 0;    ///< that gave the points
    std::size_t skipped = 0; ///< that gave none
    int first_skipped_line = 0;
    std::string first_skipped_why;     ///< "not a number"; empty where none was skipped
    std::vector<std::string> columns;  ///< as understood: "|P| [dB]: magnitude, dB"
    std::vector<std::string> warnings; ///< whatever was assumed, averaged or left out
};

/// A measured unit. The points themselves are immutable and shared between copies of the project.
struct MeasurementSource {
    std::string file;   ///< relative to the project file
    std::string sha256; ///< of the file when it was taken in, lower-case hex; empty if not pinned
    int integrators = 0;
    int unstable_poles = 0;
    std::optional<FittedModel> fit;
    std::shared_ptr<const MeasuredResponse> response; ///< null where the file could not be loaded
    std::shared_ptr<const ReadingRecord> reading;     ///< null where `response` is; not compared

    /// Compares what the project file holds, and the points by value.
    bool operator==(const MeasurementSource& other) const;
};

using PlantSource = std::variant<FormulaSource, RootsSource, CoefficientsSource, MeasurementSource>;

/// One measured unit or modelled operating point; all cases of a project are judged together.
struct PlantCase {
    std::string name;
    PlantSource source;
    bool operator==(const PlantCase&) const = default;
};

/// The model behind a formula, roots or coefficients; the fitted model of a measurement; nothing
/// for a measurement without a fit. Throws InputError as the formula parser does, and for an
/// improper plant.
std::optional<PlantModel> model_of(const PlantSource& source);

} // namespace cornerwright
