#pragma once

class QMenu;

namespace cornerwright {

class TrialBook;

/// Keeps a menu in step with the book: which trial to compare with, or none.
void followTrials(QMenu& menu, TrialBook& book);

} // namespace cornerwright
