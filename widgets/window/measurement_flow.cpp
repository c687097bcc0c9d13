#include "widgets/window/measurement_flow.h"

#include "widgets/document/document.h"
#include "widgets/fitting/fit_panel.h"
#include "widgets/import/import_panel.h"
#include "widgets/view_state.h"
#include "widgets/window/notice_strip.h"

#include <QStackedWidget>

namespace cornerwright {

namespace {
const QString topic = QStringLiteral("measurements");
}

MeasurementFlow::MeasurementFlow(Document& document, ViewState& viewState, NoticeStrip& notices,
                                 QStackedWidget& pages, QObject* parent)
    : QObject(parent),
      document_(document),
      viewState_(viewState),
      notices_(notices),
      pages_(pages),
      import_(new ImportPanel(document, viewState)),
      fit_(new FitPanel(document, viewState)) {
    pages_.addWidget(import_);
    pages_.addWidget(fit_);
    connect(import_, &ImportPanel::closed, this, &MeasurementFlow::goBack);
    connect(fit_, &FitPanel::closed, this, &MeasurementFlow::goBack);
    connect(fit_, &FitPanel::taken, this, &MeasurementFlow::tell);
    connect(import_, &ImportPanel::taken, this, [this](const QString& sentence) {
        viewState_.setShownCase(document_.project().plant_cases.size() - 1);
        tell(sentence);
    });
    connect(import_, &ImportPanel::failed, this,
            [this](const QString& why) { notices_.show(NoticeStrip::Kind::problem, why, topic); });
    // What is on its way in was meant for the project that was open.
    connect(&document_, &Document::projectReplaced, import_, &ImportPanel::dismiss);
    connect(&document_, &Document::projectReplaced, fit_, &FitPanel::dismiss);
}

void MeasurementFlow::takeIn(const QStringList& paths) {
    if (!paths.isEmpty()) {
        document_.cancelDrag();
        pages_.setCurrentWidget(import_);
        import_->add(paths);
    }
}

void MeasurementFlow::fit(std::size_t caseIndex) {
    document_.cancelDrag();
    if (fit_->open(caseIndex)) {
        pages_.setCurrentWidget(fit_);
    } else {
        notices_.show(NoticeStrip::Kind::information,
                      tr("A model is fitted to a measured case; this one has no measurement."),
                      topic);
    }
}

void MeasurementFlow::tell(const QString& sentence) {
    notices_.show(NoticeStrip::Kind::information, sentence, topic);
}

void MeasurementFlow::goBack() {
    if (pages_.currentWidget() == import_ || pages_.currentWidget() == fit_) {
        pages_.setCurrentIndex(0);
        pages_.currentWidget()->setFocus(Qt::OtherFocusReason);
    }
}

} // namespace cornerwright
