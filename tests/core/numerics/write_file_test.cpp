#include "core/numerics/error.h"
#include "core/numerics/write_file.h"
#include "tests/core/project/temporary_folder.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

namespace cornerwright {
namespace {

namespace fs = std::filesystem;
using testing::HasSubstr;

std::size_t files_in(const fs::path& folder) {
    return static_cast<std::size_t>(
        std::distance(fs::directory_iterator(folder), fs::directory_iterator()));
}

std::string refusal_of(const fs::path& file) {
    try {
        write_file(file, "new");
    } catch (const WriteError& error) {
        return error.what();
    }
    return {};
}

TEST(WriteFile, ReplacesTheContentAndLeavesNothingBeside) {
    const TemporaryFolder folder;
    const auto file = folder.write("a.json", "old");
    write_file(file, "new");
    EXPECT_EQ(TemporaryFolder::read(file), "new");
    EXPECT_EQ(files_in(folder.path()), 1U);
}

TEST(WriteFile, KeepsPermissions) {
    const TemporaryFolder folder;
    const auto file = folder.write("a.json", "old");
    fs::permissions(file, fs::perms::owner_read | fs::perms::owner_write | fs::perms::group_read);
    write_file(file, "new");
    EXPECT_EQ(fs::status(file).permissions(),
              fs::perms::owner_read | fs::perms::owner_write | fs::perms::group_read);
}

TEST(WriteFile, WritesBehindASymbolicLink) {
    const TemporaryFolder folder;
    const auto file = folder.write("real/a.json", "old");
    const auto link = folder.path() / "link.json";
    fs::create_symlink(file, link);
    write_file(link, "new");
    EXPECT_TRUE(fs::is_symlink(link));
    EXPECT_EQ(TemporaryFolder::read(file), "new");
}

TEST(WriteFile, AReadOnlyTargetStaysAsItWas) {
    const TemporaryFolder folder;
    const auto file = folder.write("a.json", "old");
    fs::permissions(file, fs::perms::owner_read);
    EXPECT_THAT(refusal_of(file), HasSubstr("read-only"));
    EXPECT_EQ(TemporaryFolder::read(file), "old");
    EXPECT_EQ(files_in(folder.path()), 1U);
}

TEST(WriteFile, ATargetThatCannotBeWrittenIsNamed) {
    const TemporaryFolder folder;
    EXPECT_THAT(refusal_of(folder.path() / "none" / "a.json"), HasSubstr("none/a.json: No such"));
    EXPECT_THAT(refusal_of(folder.path()), HasSubstr("not a regular file"));
    EXPECT_THAT(refusal_of("/dev/full"), HasSubstr("not a regular file"));
}

std::string refusal_of(std::span<const FileContent> files) {
    try {
        write_files(files);
    } catch (const WriteError& error) {
        return error.what();
    }
    return {};
}

TEST(WriteFiles, WritesAllAndLeavesNothingBeside) {
    const TemporaryFolder folder;
    const auto first = folder.write("a.h", "old");
    const auto second = folder.path() / "a.c";
    write_files(std::vector<FileContent>{{first, "one"}, {second, "two"}});
    EXPECT_EQ(TemporaryFolder::read(first), "one");
    EXPECT_EQ(TemporaryFolder::read(second), "two");
    EXPECT_EQ(files_in(folder.path()), 2U);
}

TEST(WriteFiles, WriteNoneWhereOneCannotBeWritten) {
    const TemporaryFolder folder;
    const auto first = folder.write("a.h", "old");
    const auto second = folder.path() / "new.c";
    const auto blocked = folder.path() / "b.c";
    fs::create_directory(blocked);
    const std::vector<FileContent> files{{first, "one"}, {second, "two"}, {blocked, "three"}};
    EXPECT_THAT(refusal_of(files), HasSubstr("b.c: it is not a regular file"));
    EXPECT_EQ(TemporaryFolder::read(first), "old");
    EXPECT_FALSE(fs::exists(second));
    EXPECT_EQ(files_in(folder.path()), 2U);
}

/// A rename that fails in the middle: the same place twice, so that the second has nothing left to
/// rename.
TEST(WriteFiles, PutBackWhatWasAlreadyRenamed) {
    const TemporaryFolder folder;
    const auto before = folder.write("a.h", "old");
    const auto made = folder.path() / "new.c";
    const auto twice = folder.path() / "b.c";
    const std::vector<FileContent> files{
        {before, "one"}, {made, "two"}, {twice, "three"}, {twice, "four"}};
    EXPECT_THAT(refusal_of(files), HasSubstr("b.c"));
    EXPECT_EQ(TemporaryFolder::read(before), "old");
    EXPECT_EQ(files_in(folder.path()), 1U);
}

} // namespace
} // namespace cornerwright
