#include "widgets/window/pane_set.h"

#include "widgets/panes/magnitude_pane.h"
#include "widgets/panes/phase_pane.h"
#include "widgets/window/work_area.h"

namespace cornerwright {

void makePanes(WorkArea& area, ViewState& viewState) {
    // The first four stand in the four places of a fresh window.
    area.addPane(QStringLiteral("magnitude"), new MagnitudePane(viewState, &area));
    area.addPane(QStringLiteral("phase"), new PhasePane(viewState, &area));
}

} // namespace cornerwright
