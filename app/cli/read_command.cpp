#include "app/cli/command.h"
#include "app/cli/json.h"
#include "app/cli/reading_options.h"
#include "app/cli/text_table.h"
#include "core/measurement/read_measurement.h"

#include <iostream>
#include <memory>

namespace cornerwright::cli {
namespace {

struct Options {
    std::string measurement;
    ReadingOptions reading;
    bool json = false;
};

void print_json(const ReadResult& result) {
    Json columns = Json::array();
    for (const ColumnInfo& column : result.columns)
        columns.push_back({{"column", column.column},
                           {"heading", column.heading},
                           {"meaning", column.meaning},
                           {"unit", column.unit}});
    Json skipped = Json::array();
    for (const SkippedRow& row : result.skipped)
        skipped.push_back({{"line", row.line}, {"why", row.why}});
    const MeasuredResponse& response = result.response;
    const Json json = {
        {"w_rad_s", response.w_rad_s},
        {"response", to_json(response.response)},
        {"coherence", response.coherence.empty() ? Json(nullptr) : Json(response.coherence)},
        {"columns", std::move(columns)},
        {"rows", result.rows},
        {"skipped", std::move(skipped)},
        {"warnings", result.warnings}};
    std::cout << json.dump() << '\n';
}

void print_for_people(const ReadResult& result) {
    TextTable table({"column", "heading", "meaning", "unit"});
    for (const ColumnInfo& column : result.columns)
        table.add({std::to_string(column.column), column.heading, column.meaning, column.unit});
    table.print(std::cout);
    const auto& w = result.response.w_rad_s;
    std::cout << '\n' << result.rows << " rows, " << w.size() << " frequencies";
    if (!w.empty())
        std::cout << " from " << people_text(Figure::of(w.front()), "rad/s") << " to "
                  << people_text(Figure::of(w.back()), "rad/s");
    std::cout << '\n';
    for (const SkippedRow& row : result.skipped)
        std::cout << "line " << row.line << " left out: " << row.why << '\n';
    for (const std::string& warning : result.warnings)
        std::cout << warning << '\n';
}

} // namespace

void add_read(CLI::App& program, int&) {
    const auto options = std::make_shared<Options>();
    CLI::App* command =
        program.add_subcommand("read", "What the reader understood of a measurement file");
    command->add_option("MEASUREMENT", options->measurement, "measurement file")->required();
    add_reading_options(*command, options->reading);
    command->add_flag("--json", options->json, "print JSON, points included");
    command->callback([options] {
        const ReadResult result =
            read_measurement(options->measurement, read_options_of(options->reading));
        options->json ? print_json(result) : print_for_people(result);
    });
}

} // namespace cornerwright::cli
