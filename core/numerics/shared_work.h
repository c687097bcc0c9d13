#pragma once

#include <cstddef>
#include <functional>

namespace cornerwright {

/// Independent pieces of work, counted by an index, for several threads.
struct SharedWork {
    std::size_t count = 0;
    int workers = 0; ///< threads, the caller's among them; 0: one a processor core
    /// Told how many pieces are done, one call at a time; false: no other is begun. May be empty.
    std::function<bool(std::size_t done)> proceed;
};

using WorkOnIndex = std::function<void(std::size_t index)>;

/// Calls `hire` once on each thread, and what it gives for the indices from 0 up, each index once.
/// A piece writes to a place of its own, so the result does not depend on the number of workers.
/// Returns false where `proceed` stopped it. Throws the first exception of a piece, after every
/// thread has ended.
bool do_shared(const SharedWork& work, const std::function<WorkOnIndex()>& hire);

} // namespace cornerwright
