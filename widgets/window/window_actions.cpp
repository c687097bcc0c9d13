#include "widgets/window/window_actions.h"

#include "widgets/window/appearance.h"
#include "widgets/window/language.h"

#include <QKeySequence>
#include <QLocale>
#include <QWidget>

namespace cornerwright {

WindowActions::WindowActions(QWidget* window) : QObject(window), window_(window) {
    makeFileActions();
    makeEditActions();
    makeViewActions();
    makeDesignActions();
    makeHelpActions();
}

void WindowActions::makeFileActions() {
    newProject = make(tr("&New"), QKeySequence::New, tr("Start an empty project"));
    open = make(tr("&Open"), QKeySequence::Open, tr("Open a project file"));
    save = make(tr("&Save"), QKeySequence::Save, tr("Save the project"));
    saveAs = make(tr("Save &as"), QKeySequence(Qt::CTRL | Qt::SHIFT | Qt::Key_S),
                  tr("Save the project under another name"));
    addMeasurements = make(tr("Add &measurements"), QKeySequence(Qt::CTRL | Qt::Key_M),
                           tr("Take measurement files in as plant cases"));
    printPane = make(tr("&Print pane"), QKeySequence(Qt::CTRL | Qt::Key_P),
                     tr("Print the pane with the focus"));
    quit = make(tr("&Quit"), QKeySequence(Qt::CTRL | Qt::Key_Q), tr("Leave the program"));
    quit->setMenuRole(QAction::QuitRole);
}

void WindowActions::makeEditActions() {
    undo = make(tr("&Undo"), QKeySequence::Undo, tr("Take the last step back"));
    redo =
        make(tr("&Redo"), QKeySequence(Qt::CTRL | Qt::SHIFT | Qt::Key_Z), tr("Do the step again"));
    redo->setShortcuts(
        {QKeySequence(Qt::CTRL | Qt::SHIFT | Qt::Key_Z), QKeySequence(Qt::CTRL | Qt::Key_Y)});
    addFormula = make(tr("Add plant &formula"), QKeySequence(Qt::CTRL | Qt::Key_F),
                      tr("Add a plant case from a formula in s"));
    removeSection = make(tr("&Remove section"), QKeySequence(Qt::CTRL | Qt::Key_Delete),
                         tr("Remove the selected section"));
    switchSection = make(tr("Turn section off or &on"), QKeySequence(Qt::CTRL | Qt::Key_Space),
                         tr("Turn the selected section off or on"));
    lockSection = make(tr("&Lock or unlock section"), QKeySequence(Qt::CTRL | Qt::Key_L),
                       tr("Locked corners stay where they are"));
}

void WindowActions::makeViewActions() {
    hertz = make(tr("&Hz instead of rad/s"), QKeySequence(Qt::CTRL | Qt::Key_H),
                 tr("Show frequencies in Hz or in rad/s"));
    hertz->setCheckable(true);
    hertz->setChecked(true);
    nextCase = make(tr("&Next case"), QKeySequence(Qt::CTRL | Qt::Key_PageDown),
                    tr("Show the next plant case"));
    previousCase = make(tr("&Previous case"), QKeySequence(Qt::CTRL | Qt::Key_PageUp),
                        tr("Show the plant case before"));
    onlyShownCase = make(tr("Draw &only the shown case"), QKeySequence(Qt::CTRL | Qt::Key_1),
                         tr("The others are not drawn; they are judged all the same"));
    everyCase = make(tr("Draw &every case"), QKeySequence(Qt::CTRL | Qt::Key_0),
                     tr("Draw the curves of every plant case"));
    languageChoices = new QActionGroup(this);
    for (const QString& code : QStringList{QString()} + languages()) {
        const QString name = code.isEmpty() ? tr("Language as the system has it")
                                            : QLocale(code).nativeLanguageName();
        QAction* action = make(name, QKeySequence(), name);
        action->setCheckable(true);
        action->setData(code);
        languageChoices->addAction(action);
    }
    grounds = new QActionGroup(this);
    const std::pair<QString, Ground> names[] = {{tr("Ground as the system has it"), Ground::system},
                                                {tr("Light ground"), Ground::light},
                                                {tr("Dark ground"), Ground::dark}};
    for (const auto& [name, ground] : names) {
        QAction* action = make(name, QKeySequence(), name);
        action->setCheckable(true);
        action->setData(static_cast<int>(ground));
        grounds->addAction(action);
    }
    wholePane = make(tr("Pane takes the &whole window"), QKeySequence(Qt::Key_F11),
                     tr("The pane with the focus takes the whole window"));
    allPanes = make(tr("&All panes again"), QKeySequence(Qt::SHIFT | Qt::Key_F11),
                    tr("Go back to all panes"));
}

void WindowActions::makeDesignActions() {
    keepTrial = make(tr("&Keep as trial"), QKeySequence(Qt::CTRL | Qt::Key_K),
                     tr("Keep a copy of this design to compare against"));
    keepTrial->setIconText(tr("Keep"));
    showTrials = make(tr("Compare &trials"), QKeySequence(Qt::CTRL | Qt::Key_T),
                      tr("Show kept trials and how their figures differ"));
    place = make(tr("&Place corners"), QKeySequence(Qt::CTRL | Qt::Key_E),
                 tr("Move the unlocked corners so that the smallest headroom grows"));
    place->setIconText(tr("Place"));
    fitModel = make(tr("&Fit a model to the shown case"), QKeySequence(Qt::CTRL | Qt::Key_G),
                    tr("Fit a rational model to the measured case, for root locus and step"));
    showHandover = make(tr("&Handover"), QKeySequence(Qt::CTRL | Qt::Key_D),
                        tr("Sampling and realisation: what the firmware gets"));

    writeReport = make(tr("Write &report"), QKeySequence(Qt::CTRL | Qt::Key_R),
                       tr("Write the design review report as one HTML file"));
    writeReport->setIconText(tr("Report"));
}

void WindowActions::makeHelpActions() {
    explain = make(tr("&What is this?"), QKeySequence(Qt::Key_F1),
                   tr("Explain what has the focus: definition, formula, source"));
    windowHelp = make(tr("Mouse, &keys and files"), QKeySequence(Qt::SHIFT | Qt::Key_F1),
                      tr("How the window is worked with"));
    about = make(tr("&About Cornerwright"), QKeySequence(),
                 tr("What this program is, and its cautions"));
    about->setMenuRole(QAction::AboutRole);
}

QAction* WindowActions::make(const QString& text, const QKeySequence& keys, const QString& tip) {
    auto* action = new QAction(text, this);
    action->setShortcut(keys);
    action->setToolTip(keys.isEmpty() ? tip
                                      : QStringLiteral("%1 (%2)").arg(
                                            tip, keys.toString(QKeySequence::NativeText)));
    action->setStatusTip(tip);
    window_->addAction(action);
    return action;
}

void WindowActions::setUndo(bool can, const QString& what) {
    undo->setEnabled(can);
    undo->setText(what.isEmpty() ? tr("&Undo") : tr("&Undo: %1").arg(what));
    undo->setIconText(tr("Undo"));
}

void WindowActions::setRedo(bool can, const QString& what) {
    redo->setEnabled(can);
    redo->setText(what.isEmpty() ? tr("&Redo") : tr("&Redo: %1").arg(what));
    redo->setIconText(tr("Redo"));
}

} // namespace cornerwright
