<?xml version="1.0" encoding="utf-8"?>
<!DOCTYPE TS>
<TS version="2.1" language="de" sourcelanguage="en">
<context>
    <name>MarginLabel</name>
    <message>
        <source>realised</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>MeasurementWords</name>
    <message>
        <source>%1 rows gave points</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>, none was skipped.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>, %1 skipped, the first in line %2: %3.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Columns: %1.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1 more remarks of the reader.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>This case is a model: nothing of it was measured.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>The file could not be read.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>The file holds no coherence, so the random error is not known.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>The file does not say how many averages were taken, so the random error is not known.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1 averages.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Fit of order %1, misfit %2.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>No model is fitted.</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright</name>
    <message>
        <source>%1 rows skipped, the first in line %2: %3.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1 could not be loaded</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1 points</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>coherence ≥ %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>no fit</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>model, order %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>dead time %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>binds 1 requirement</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>binds %1 requirements</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Fit: order %1, misfit %2, dead time %3</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>No fit: locus and step are not determined</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Sampled at %1, computation %2</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Costs %1 at the last crossover</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>centre</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>depth</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>width ζ</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>ratio %1 · lifts %2° at %3</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>ratio %1 · lags %2° at %3</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Phase margin</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Gain margin</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Gain reduction margin</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Delay margin</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Sensitivity peak</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Complementary peak</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Control effort peak</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Bandwidth</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Rejection</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Roll-off</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Overshoot</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Peak time</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Rise time</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Settling time</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Steady-state error</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Control peak</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Disturbance peak</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Settling time, %1 %</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Rejection up to %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Roll-off from %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Step error</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Ramp error</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Parabola error</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>met</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>unmet</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>not determined</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Gain</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Integrator</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>PI</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Lead</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Lag</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Real zero</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Low-pass, first order</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Complex zeros</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Low-pass, second order</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Notch</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Washout</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>gain</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>corner</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>zero</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>pole</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>damping</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>zero damping</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>pole damping</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1 over</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1 short</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>design</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>realised</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>no requirements yet</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1 of %2 unmet · worst: %3</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1 of %2 not determined</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>all %1 met · tightest: %2</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Expected at least one limit, found none.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Expected the lower limit below the upper one.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Expected a limit above zero.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Expected a frequency above zero.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Expected a band above zero.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Expected no unit, found &quot;%1&quot;.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Expected a unit such as %1, found &quot;%2&quot;.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Expected a number, found nothing.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Expected a number, found &quot;%1&quot;.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1 is no usable value here.</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::AboutPage</name>
    <message>
        <source>About Cornerwright</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>version %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Back</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>A workbench for closing feedback loops on real equipment: from a measured or modelled plant, over corners dragged into place, to the difference equation that the firmware runs, with every margin judged on every unit.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Cautions</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Closing a loop on real equipment can move, heat or energise it without warning. First close it with limited effort, an independent stop, and nobody in reach.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>These figures rest on the plant data given. They say nothing of saturation, faults or what was not measured.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Local codes, the machine&apos;s risk assessment and licensed practice decide.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Licence</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Free software under the GNU General Public License, version 3 or later. There is no warranty, to the extent permitted by law.</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::BodePane</name>
    <message>
        <source>loop</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>realised</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>plant</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>design loop</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>realised loop</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>other cases</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>trial</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>zero of %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>pole of %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>limit of %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>case</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::CaseRow</name>
    <message>
        <source>Name of the case</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Plant case %1, shown</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Plant case %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Draw %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Draw the curves of %1 (it is judged all the same)</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Show this case	Enter</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Do not draw it	Space</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Draw it	Space</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Rename	F2</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Remove	Del</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::CasesPanel</name>
    <message>
        <source>Plant cases</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>+ formula</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Add a plant case from a formula</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>+ measurement</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Add plant cases from measurement files</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Add case %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Rename case %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Remove case %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>No plant yet: add a measurement or a formula.</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::ChainPanel</name>
    <message>
        <source>Chain</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>+ add section</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Add section</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Sections</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Add %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Remove %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Move %1</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::Document</name>
    <message>
        <source>untitled</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::ExportRow</name>
    <message>
        <source>Name in the files</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>C99</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Structured text</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>JSON</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>CSV</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Hand over as %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Report</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Write the review report</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>✗ %1 of the requirements are unmet; every file will say so.</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::FileFlow</name>
    <message>
        <source>Save</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Discard changes</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Stay</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1 has unsaved changes. Save them before another project is opened?</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Open project</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Cornerwright projects (*%1);;All files (*)</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1 has unsaved changes. Save them before a new project is started?</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Save project</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Cornerwright projects (*%1)</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Add measurements</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Measurements (*.csv *.txt *.dat *.tsv *.s?p *.ts *.uff *.unv *.58);;All files (*)</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Add %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>an unsaved project</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>The program did not end in order last time. Unsaved changes of %1 from %2 were kept.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Recover</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Discard</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::FormulaEntry</name>
    <message>
        <source>name</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Name of the new case</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>such as 42 exp(-0.0008 s) / (s (s/31 + 1))</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Plant as a formula in s</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Add</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Cancel</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>model</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::HandoverFlow</name>
    <message>
        <source>Folder for the handover</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Written to %1: %2.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Write the review report</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>HTML (*.html)</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Report written to %1.</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::HelpPanel</name>
    <message>
        <source>Help</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Close the help</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Help text</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::LedgerModel</name>
    <message>
        <source>measure</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>limit</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>worst</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>where</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>headroom</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>state</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1, headroom %2</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1, %2: %3 (%4)</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::LedgerPanel</name>
    <message>
        <source>Requirements</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>+ add requirement</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Add requirement</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Change %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Requirement ledger</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Add %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Remove %1</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::LegendWidget</name>
    <message>
        <source>Legend</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::LoopPlanePane</name>
    <message>
        <source>design loop</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>realised loop</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>other cases</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>realised</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>loop</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>gain</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>case</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::MagnitudePane</name>
    <message>
        <source>gain</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Add at %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Add %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1 unstable</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1: stability not determined</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>design loop</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>realised loop</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>crossover %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Magnitude</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::MainWindow</name>
    <message>
        <source>Turn section off or on</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Lock or unlock section</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Remove %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Assessing every case …</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>The assessment failed: %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Placing the unlocked corners …</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Placing the unlocked corners … %1 %</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Place corners</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>The design was changed while corners were placed. %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Take the placed corners</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Keep the present design</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1[*] - Cornerwright</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>unsaved changes</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1 has unsaved changes. Save them before leaving?</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Lower centre</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Upper right</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Lower &amp;right</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;File</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Open &amp;recent</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Edit</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;View</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Design</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Help</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::NicholsPane</name>
    <message>
        <source>limit of %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Nichols</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::NoticeStrip</name>
    <message>
        <source>Problem</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Notice</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Close this notice</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::NyquistPane</name>
    <message>
        <source>compressed</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>linear</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Radius beyond 1 drawn as 1 + ln r, so that all of the loop stays in sight</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>The plane as it is</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>limit of %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Nyquist</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::PaneSlot</name>
    <message>
        <source>Take the whole window</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Show another pane here</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Pane: %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1: take the whole window</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Go back to all panes</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::PhasePane</name>
    <message>
        <source>Phase</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::PlotPane</name>
    <message>
        <source>Move %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Nudge %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Remove %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Turn %1 on</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Turn %1 off</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Not saved</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1 could not be written.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Show all</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Copy as picture</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Save picture …</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Save data as CSV …</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Save picture of %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>PDF (*.pdf);;SVG (*.svg);;PNG (*.png)</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Save data of %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Comma-separated values (*.csv)</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::QualityPane</name>
    <message>
        <source>What the measurement file says</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>coherence</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>random error</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>fit misfit</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>case shown</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>other cases</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>no fit of this case</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>not known for this case</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>case</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Measurement quality</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::RealisationPane</name>
    <message>
        <source>No difference equation: only the design loop is judged.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1 second-order sections</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>design loop counts hold and delay</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>judge the difference equation</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Tustin</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Tustin, exact at each corner</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Tustin, exact at one frequency</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>matched roots</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>step invariant</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>ramp invariant</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>direct form 1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>direct form 2 transposed</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>delta operator</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>64-bit floating point</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>32-bit floating point</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>fixed point</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1 bits</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Sample period or rate</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Computation delay</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Method</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Exact at</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Structure</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Number format</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Word length</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Fraction bits</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Sampling, realisation and handover</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Expected a value above zero.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Expected a delay of zero or more.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Expected a whole number from 0 to %1.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Change sample period</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Change computation delay</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Count hold in the design loop</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Judge the difference equation</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Change matched frequency</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Change fraction bits</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Change method</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Change structure</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Change number format</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Change word length</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Handover</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::RecoveryCopy</name>
    <message>
        <source>The recovery copy could not be written to %1.</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::RequirementEditor</name>
    <message>
        <source>Measure</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>At least</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>At most</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>none</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>step</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>ramp</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>parabola</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Input</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Remove</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Done</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>at least</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>at most</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>band</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>up to</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>from</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>input</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::RootLocusPane</name>
    <message>
        <source>zero of %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>pole of %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>closed-loop pole</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>branch</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Root locus</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::RunStatus</name>
    <message>
        <source>Cancel</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::SectionCard</name>
    <message>
        <source>Name of the section</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Lock</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Turn off</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Drag to move in the chain</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Section %1: %2</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Section %1: %2, off</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>%1, %2</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Unlock %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Lock %1: its corners stay where they are</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Turn %1 off</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Turn %1 on</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Move %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>off · press space to turn on</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Change %1 of %2</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Lock %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Rename %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Turn off	Space</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Turn on	Space</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Unlock	L</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Lock	L</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Rename	F2</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Move up	Alt+Up</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Move down	Alt+Down</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Remove	Del</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::SensitivityPane</name>
    <message>
        <source>design loop</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>realised loop</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>other cases</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>limit of %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>case</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>loop</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Sensitivity</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::StepPane</name>
    <message>
        <source>output y</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>control u</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>disturbance</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>design</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>realised</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>limit of %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>design loop unstable</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>case</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>loop</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Step response</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::TopBar</name>
    <message>
        <source>The case drawn full, with the handles on its curve</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>A kept trial to compare with</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Hz</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>rad/s</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Frequencies in Hz; switch to rad/s</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Frequencies in rad/s; switch to Hz</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>no case</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Case: %1 ▾</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Case shown: %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Trial: none ▾</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Trial: %1 ▾</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Compared trial: none</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Compared trial: %1</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::TrialBook</name>
    <message>
        <source>trial %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>compare with none</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::TrialsPane</name>
    <message>
        <source>▲ better</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>▼ worse</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>No trial kept yet. Keep (Ctrl+K) puts a copy of the present design here to compare with.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Differences between the trial and the present design</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>measure</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>limit</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>trial</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>now</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>change</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Compare with %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Name of the trial</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Return to it</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Return to %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Forget %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Trials</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::VerdictPill</name>
    <message>
        <source>not assessed yet</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Verdict: %1</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>cornerwright::WindowActions</name>
    <message>
        <source>&amp;New</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Start an empty project</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Open</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Open a project file</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Save</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Save the project</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Save &amp;as</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Save the project under another name</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Add &amp;measurements</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Take measurement files in as plant cases</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Quit</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Leave the program</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Undo</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Take the last step back</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Redo</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Do the step again</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Add plant &amp;formula</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Add a plant case from a formula in s</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Remove section</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Remove the selected section</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Turn section off or &amp;on</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Turn the selected section off or on</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Lock or unlock section</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Locked corners stay where they are</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Hz instead of rad/s</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Show frequencies in Hz or in rad/s</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Next case</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Show the next plant case</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Previous case</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Show the plant case before</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Ground as the system has it</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Light ground</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Dark ground</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Pane takes the &amp;whole window</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>The pane with the focus takes the whole window</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;All panes again</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Go back to all panes</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Keep as trial</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Keep a copy of this design to compare against</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Keep</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Compare &amp;trials</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Show kept trials and how their figures differ</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Place corners</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Move the unlocked corners so that the smallest headroom grows</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Place</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Handover</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Sampling and realisation: what the firmware gets</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Write &amp;report</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Write the design review report as one HTML file</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Report</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;About Cornerwright</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>What this program is, and its cautions</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Undo: %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Undo</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>&amp;Redo: %1</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Redo</source>
        <translation type="unfinished"></translation>
    </message>
</context>
<context>
    <name>main</name>
    <message>
        <source>Write a picture of the window to FILE (PNG) and leave.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Size of the window, such as 1600x950.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Dark ground, whatever the system says.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Light ground, whatever the system says.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Open the first demo project.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>Keep a report of what the window shows in FILE (JSON), for tests.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>A workbench for closing feedback loops on real equipment.</source>
        <translation type="unfinished"></translation>
    </message>
    <message>
        <source>A project or measurement file.</source>
        <translation type="unfinished"></translation>
    </message>
</context>
</TS>
