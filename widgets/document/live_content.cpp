#include "widgets/document/live_content.h"

#include <algorithm>

namespace cornerwright {

LiveContent::LiveContent(Document& document, ViewState& viewState, QObject* parent)
    : QObject(parent), document_(document), viewState_(viewState) {
    connect(&document_, &Document::projectReplaced, this, [this] {
        content_ = PaneContent();
        viewState_.setFrequencyWindowRadS(std::nullopt);
        viewState_.setSelectedSection(std::nullopt);
        viewState_.setFollowed(std::nullopt);
        viewState_.setHiddenCases({});
        viewState_.setShownCase(0);
        Q_EMIT contentChanged();
    });
    connect(&document_, &Document::projectChanged, this, [this] {
        keepIndicesInside();
        requestAssessment();
    });
    connect(&document_, &Document::dragBegan, this, [this] {
        content_.ghost = content_.assessment;
        Q_EMIT contentChanged();
    });
    connect(&document_, &Document::dragEnded, this, [this] {
        content_.ghost.reset();
        Q_EMIT contentChanged();
    });
    connect(&viewState_, &ViewState::shownCaseChanged, this, &LiveContent::requestAssessment);
    connect(&runner_, &AssessmentRunner::assessed, this, &LiveContent::take);
}

void LiveContent::setTrial(std::shared_ptr<const Assessment> trial) {
    if (content_.trial != trial) {
        content_.trial = std::move(trial);
        Q_EMIT contentChanged();
    }
}

void LiveContent::requestAssessment() {
    runner_.request(document_.shared(), viewState_.shownCase());
}

void LiveContent::take(const AssessedProject& result) {
    content_.project = result.project;
    content_.assessment = result.assessment;
    content_.locus = result.locus;
    Q_EMIT contentChanged();
}

void LiveContent::keepIndicesInside() {
    const std::size_t cases = document_.project().plant_cases.size();
    const std::size_t sections = document_.project().compensator.size();
    if (viewState_.shownCase() >= cases) {
        viewState_.setShownCase(cases == 0 ? 0 : cases - 1);
    }
    std::set<std::size_t> hidden = viewState_.hiddenCases();
    std::erase_if(hidden, [cases](std::size_t index) { return index >= cases; });
    viewState_.setHiddenCases(std::move(hidden));
    if (viewState_.selectedSection() && *viewState_.selectedSection() >= sections) {
        viewState_.setSelectedSection(std::nullopt);
    }
}

} // namespace cornerwright
