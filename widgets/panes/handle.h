#pragma once

#include "widgets/section_drag.h"

#include <QPointF>
#include <QRectF>
#include <QString>
#include <Qt>

#include <cstddef>

namespace cornerwright {

/// What a handle moves.
enum class HandleKind {
    section_part,     ///< `index`: section of the chain, `part`
    section_root,     ///< root locus: `index`: section, `sub`: of draggableRootsOf
    gain_curve,       ///< the loop curve itself
    closed_loop_pole, ///< `index`: branch of the locus
    limit,            ///< `index`: requirement, `sub`: which edge (see the pane)
};

/// Names a handle while content and axes change under it.
struct HandleId {
    HandleKind kind = HandleKind::section_part;
    std::size_t index = 0;
    SectionPart part = SectionPart::corner;
    int sub = 0;

    bool operator==(const HandleId&) const = default;
};

/// A handle as it stands on the pane.
struct Handle {
    HandleId id;
    QPointF at;   ///< pixel
    QRectF area;  ///< where a press takes it
    QString name; ///< "zero of Lead", for the undo step and the label
    Qt::CursorShape cursor = Qt::SizeHorCursor;
    bool shiftIsFine = true; ///< false where shift means something else (width of a notch)
};

/// A hand's way since the press, in pixels, with fine mode already worked in.
struct DragMotion {
    QPointF from; ///< where the handle stood
    QPointF to;   ///< where it is wished
    bool shift = false;
    /// Travel with the first few pixels across the main direction taken off, so that a sideways
    /// drag does not tilt into the second parameter.
    QPointF steadied() const;
};

/// A square of at least 18 pixels a side about the point: nothing smaller can be hit in haste.
QRectF touchArea(const QPointF& at, double reach = 9.0);

} // namespace cornerwright
