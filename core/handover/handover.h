#pragma once

#include "core/engine/assessment.h"
#include "core/project/project.h"

#include <filesystem>
#include <string>
#include <string_view>
#include <vector>

namespace cornerwright {

enum class HandoverForm { c99, structured_text, json, csv };

/// The word of the command line: "c99", "structured-text", "json", "csv".
std::string_view name_of(HandoverForm form);

/// One file of a handover, not yet written.
struct HandoverFile {
    std::string name;
    std::string bytes;
};

/// What a handover is made from.
struct HandoverInput {
    const Project* project = nullptr;       ///< not owned
    const Assessment* assessment = nullptr; ///< not owned, of that project
    std::string project_sha256;             ///< of the project file; empty: not saved
    std::string name = "compensator";       ///< of the functions and files
};

/// Throws InputError where `name` cannot name the functions of every form: an identifier of C and
/// of IEC 61131-3 alike, no reserved word.
void check_handover_name(const std::string& name);

/// The difference equation as firmware receives it, with its evidence and test vectors. The same
/// input gives the same bytes.
///
/// c99: NAME.h, NAME.c, NAME_selfcheck.c (a main that returns 0 when every output equals the
/// vectors); structured-text: NAME.st, NAME_vectors.csv; json: NAME.json; csv: NAME.csv.
///
/// Unmet requirements refuse nothing; every file says so at its head. Throws InputError where there
/// is no difference equation (the reason of the assessment) or the name cannot name a function.
std::vector<HandoverFile> handover_files(const HandoverInput& input, HandoverForm form);

/// Writes all of the files into the folder, or none: each beside under another name first, then
/// renamed. The folder is made where it is missing. Throws WriteError.
void write_handover(const std::vector<HandoverFile>& files, const std::filesystem::path& folder);

} // namespace cornerwright
