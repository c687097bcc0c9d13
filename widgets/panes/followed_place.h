#pragma once

#include "core/engine/assessment.h"
#include "widgets/panes/painting.h"

namespace cornerwright {

class ViewState;

/// How the requirement that the ledger led to stands now, on its loop of the shown case; null where
/// none is followed or its case is not the one shown.
const Judgement* followedJudgement(const ViewState& viewState, const Assessment& assessment);

/// The measure of that requirement. Only where there is a judgement.
Measure followedMeasure(const ViewState& viewState, const Assessment& assessment);

/// The loop of a case by its name; null where there is no realised loop.
const LoopAssessment* loopOf(const CaseAssessment& shown, LoopName loop);

/// Whether the figure is also named beside the ring.
enum class RingName { shown, left_out };

/// A ring about the place on a curve where the followed requirement is measured, and what stands
/// there: "✗ Roll-off from 400 Hz −17.2 dB, realised loop".
void drawFollowedPlace(QPainter& painter, const QPointF& at, const ViewState& viewState,
                       const Assessment& assessment, LabelPlacer& placer, const Theme& theme,
                       RingName name = RingName::shown);

} // namespace cornerwright
