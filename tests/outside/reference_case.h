#pragma once

#include "core/project/project.h"

#include <nlohmann/json.hpp>

#include <filesystem>
#include <string>
#include <vector>

namespace cornerwright::outside {

using Json = nlohmann::json;

/// One project with the figures that an independent computation found for it.
///
/// `expected` is a part of what `assess --json` prints: `cases[].loops.design` and `.realised`, and
/// where there are requirements `requirements` and `verdict`. A figure that is absent is not
/// compared. `tolerances` replaces the tolerance of single figures (see `differences`).
struct ReferenceCase {
    std::string name;
    Json project;
    Json files; ///< text of each measurement file by its name relative to the project; or null
    Json expected;
    Json tolerances;
};

/// The folder of cases: that of the environment variable CORNERWRIGHT_CASES, else the one beside
/// these tests.
std::filesystem::path case_folder();

/// Names (without ".json") of the cases in the folder, sorted.
std::vector<std::string> case_names();

ReferenceCase read_case(const std::string& name);

/// What the program says about a case.
struct Assessed {
    Project project;
    Json assessment;      ///< as `assess --json` prints it
    Json handover;        ///< as `handover --as json` writes it; null without a realisation
    double seconds = 0.0; ///< taken by the assessment alone
};

/// Writes the project and its files into a folder of its own, loads and assesses it.
Assessed assess(const ReferenceCase& reference);

} // namespace cornerwright::outside
