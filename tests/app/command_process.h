#pragma once

#include <gtest/gtest.h>

#include <array>
#include <cstdio>
#include <filesystem>
#include <fstream>
#include <sstream>
#include <string>
#include <sys/wait.h>
#include <unistd.h>

namespace cornerwright::process {

namespace fs = std::filesystem;

struct Outcome {
    int status = -1;
    std::string out;
    std::string err;
};

inline std::string text_of(const fs::path& file) {
    std::ostringstream text;
    text << std::ifstream(file, std::ios::binary).rdbuf();
    return text.str();
}

/// A folder of its own for one test, removed with it.
class Folder {
  public:
    Folder() {
        std::string pattern = (fs::temp_directory_path() / "cornerwright-XXXXXX").string();
        path_ = ::mkdtemp(pattern.data());
    }
    ~Folder() {
        std::error_code ignored;
        fs::remove_all(path_, ignored);
    }
    Folder(const Folder&) = delete;
    Folder& operator=(const Folder&) = delete;

    fs::path operator/(const std::string& name) const { return path_ / name; }

    fs::path write(const std::string& name, const std::string& text) const {
        fs::create_directories((path_ / name).parent_path());
        std::ofstream(path_ / name, std::ios::binary) << text;
        return path_ / name;
    }

    /// Runs the command line in this folder, through the shell.
    Outcome run(const std::string& arguments) const {
        const fs::path errors = path_ / ".errors";
        const std::string command = "cd '" + path_.string() + "' && '" + CORNERWRIGHT_CLI + "' " +
                                    arguments + " 2>'" + errors.string() + "'";
        Outcome outcome;
        FILE* pipe = ::popen(command.c_str(), "r");
        std::array<char, 4096> block{};
        for (std::size_t n = 0; (n = std::fread(block.data(), 1, block.size(), pipe)) > 0;)
            outcome.out.append(block.data(), n);
        outcome.status = WEXITSTATUS(::pclose(pipe));
        outcome.err = text_of(errors);
        return outcome;
    }

  private:
    fs::path path_;
};

} // namespace cornerwright::process
