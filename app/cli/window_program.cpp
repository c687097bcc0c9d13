#include "app/cli/window_program.h"

#include "app/cli/command.h"

#include <cerrno>
#include <cstring>
#include <filesystem>
#include <spawn.h>
#include <sys/wait.h>
#include <unistd.h>

namespace cornerwright::cli {
namespace {

namespace fs = std::filesystem;

fs::path window_program(const std::string& option) {
    const fs::path here = fs::read_symlink("/proc/self/exe").parent_path();
    for (const fs::path& place :
         {here / "cornerwright", here.parent_path() / "window/cornerwright"})
        if (fs::is_regular_file(place))
            return place;
    throw UsageError(option +
                     ": expected the program cornerwright beside this one to write it, "
                     "found none in " +
                     here.string());
}

} // namespace

int run_window_program(const std::vector<std::string>& arguments, const std::string& option) {
    const std::string program = window_program(option).string();
    std::vector<std::string> words{program};
    words.insert(words.end(), arguments.begin(), arguments.end());
    std::vector<char*> pointers;
    pointers.reserve(words.size() + 1);
    for (std::string& word : words)
        pointers.push_back(word.data());
    pointers.push_back(nullptr);

    pid_t child = 0;
    const int problem =
        ::posix_spawn(&child, program.c_str(), nullptr, nullptr, pointers.data(), environ);
    if (problem != 0)
        throw UsageError(option + ": could not run " + program + ": " + std::strerror(problem));
    int ended = 0;
    while (::waitpid(child, &ended, 0) < 0 && errno == EINTR) {
    }
    return WIFEXITED(ended) ? WEXITSTATUS(ended) : cannot_write;
}

} // namespace cornerwright::cli
