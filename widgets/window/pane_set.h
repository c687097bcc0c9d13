#pragma once

namespace cornerwright {

class TrialBook;
class ViewState;
class WorkArea;

/// Makes every pane and puts it into the work area. To add a pane, make it here.
void makePanes(WorkArea& area, ViewState& viewState, TrialBook& trials);

} // namespace cornerwright
