#pragma once

#include <filesystem>
#include <span>
#include <string_view>

namespace cornerwright {

/// Puts `content` at `file` so that a reader finds the old content or the new one, never a part:
/// written beside under another name, synced, renamed, the folder synced. Follows a symbolic link
/// and keeps the permissions of a file that is replaced. Throws WriteError (the sentence names the
/// file and the reason) where the folder is missing, the target is read-only, or the disk is full;
/// the old file then stands as it was and nothing is left beside it.
void write_file(const std::filesystem::path& file, std::string_view content);

struct FileContent {
    std::filesystem::path file;
    std::string_view content;
};

/// Several files, all or none: every content is written beside its place first, then all are
/// renamed; where a rename fails those before it are put back. Only a power cut between two renames
/// can part them. Otherwise as `write_file`.
void write_files(std::span<const FileContent> files);

} // namespace cornerwright
