#include "widgets/window/pane_set.h"

#include "widgets/design/room_pane.h"
#include "widgets/design/tolerance_pane.h"
#include "widgets/fleet/fleet_pane.h"
#include "widgets/handover/realisation_pane.h"
#include "widgets/panes/magnitude_pane.h"
#include "widgets/panes/nichols_pane.h"
#include "widgets/panes/nyquist_pane.h"
#include "widgets/panes/phase_pane.h"
#include "widgets/panes/quality_pane.h"
#include "widgets/panes/root_locus_pane.h"
#include "widgets/panes/sensitivity_pane.h"
#include "widgets/panes/step_pane.h"
#include "widgets/trials/trials_pane.h"
#include "widgets/window/work_area.h"

namespace cornerwright {

void makePanes(WorkArea& area, ViewState& viewState, TrialBook& trials) {
    // The first four stand in the four places of a fresh window.
    area.addPane(QStringLiteral("magnitude"), new MagnitudePane(viewState, &area));
    area.addPane(QStringLiteral("phase"), new PhasePane(viewState, &area));
    area.addPane(QStringLiteral("root-locus"), new RootLocusPane(viewState, &area));
    area.addPane(QStringLiteral("step"), new StepPane(viewState, &area));
    area.addPane(QStringLiteral("nyquist"), new NyquistPane(viewState, &area));
    area.addPane(QStringLiteral("nichols"), new NicholsPane(viewState, &area));
    area.addPane(QStringLiteral("sensitivity"), new SensitivityPane(viewState, &area));
    area.addPane(QStringLiteral("quality"), new QualityPane(viewState, &area));
    area.addPane(QStringLiteral("handover"), new RealisationPane(viewState, &area));
    area.addPane(QStringLiteral("trials"), new TrialsPane(viewState, trials, &area));
    area.addPane(QStringLiteral("room"), new RoomPane(viewState, &area));
    area.addPane(QStringLiteral("tolerance"), new TolerancePane(viewState, &area));
    area.addPane(QStringLiteral("fleet"), new FleetPane(viewState, &area));
}

} // namespace cornerwright
