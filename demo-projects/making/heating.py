"""The heater of a germination chamber: long dead time, one model and one measured unit."""
import math

import numpy as np

from making.parts import measured, misfit_db, project_text, response, rounded, sha256, stated

POINTS, FROM_RAD_S, TO_RAD_S, AVERAGES, SEED = 160, 2e-4, 0.12, 6, 201
FLOOR_K_PER_PERCENT = 2e-3
UNIT = {"gain": 0.60, "slow_s": 860.0, "fast_s": 55.0, "dead_time_s": 104.0}


def chamber(unit):
    """From heater power in percent to air temperature in K."""
    slow, fast = rounded(1.0 / unit["slow_s"]), rounded(1.0 / unit["fast_s"])
    return {"zeros_rad_s": [], "poles_rad_s": [[-slow, 0], [-fast, 0]],
            "gain": rounded(unit["gain"] * slow * fast), "dead_time_s": unit["dead_time_s"]}


def measurement():
    model = chamber(UNIT)
    w = np.array([rounded(x) for x in np.geomspace(FROM_RAD_S, TO_RAD_S, POINTS)])
    values, coherence = measured(response(model, w), FLOOR_K_PER_PERCENT, AVERAGES, SEED)
    text = stated([
        "Germination chamber, unit 2. Invented; no real chamber was measured.",
        "From heater power (percent) to air temperature (K). The plant behind these figures:",
        f"  P(s) = {UNIT['gain']:g} exp(-{UNIT['dead_time_s']:g} s)"
        f" / (({UNIT['slow_s']:g} s + 1) ({UNIT['fast_s']:g} s + 1))",
        f"Noise of {AVERAGES} averaged spectra over a floor of {FLOOR_K_PER_PERCENT:g} K/percent,"
        f" seed {SEED}.",
    ]) + "Angular frequency (rad/s),Real,Imaginary,Coherence\n" + "".join(
        f"{x:g},{v.real:.6g},{v.imag:.6g},{c:.5f}\n" for x, v, c in zip(w, values, coherence))
    return text, {**model, "misfit_db": rounded(misfit_db(model, w, values, coherence), 3)}


NOTES = (
    "The heater of a germination chamber: power in percent to air temperature in K, through a long"
    " duct. One model from the drawing, one unit as measured overnight.\n\nInvented: the measurement"
    " was computed by making/heating.py from the plant that the file states in its first lines, with"
    " seeded noise; its fit is that stated plant, not one that was fitted to the points.\n\nDead time"
    " sets the pace here: no compensator makes the loop much faster than the duct. Unit 2"
    " has more dead time and more gain than the chamber as drawn, and still every requirement holds"
    " on both."
)


def germination_chamber():
    text, fit = measurement()
    project = {
        "cornerwright": 1,
        "title": "Germination chamber, air heater",
        "notes": NOTES,
        "plant_cases": [
            {"name": "as drawn", "formula": "0.55 exp(-95 s) / ((900 s + 1) (60 s + 1))"},
            {"name": "unit 2", "measurement": {"file": "measurements/unit-2.csv",
                                               "sha256": sha256(text)},
             "integrators": 0, "unstable_poles": 0, "fit": fit},
        ],
        "compensator": [
            {"kind": "gain", "gain": 6.0},
            {"kind": "pi", "corner_rad_s": 0.001},
            {"kind": "lead", "zero_rad_s": 0.0167, "pole_rad_s": 0.1, "label": "against the duct"},
        ],
        "sampling": {"sample_period_s": 1.0, "computation_delay_s": 0.05,
                     "design_includes_hold": True},
        "realisation": {"method": "tustin", "structure": "direct_form_1",
                        "number_format": {"type": "float64"}},
        "requirements": [
            {"measure": "phase_margin", "at_least_deg": 55.0},
            {"measure": "gain_margin", "at_least_db": 8.0},
            {"measure": "delay_margin", "at_least_s": 60.0},
            {"measure": "sensitivity_peak", "at_most_db": 5.0},
            {"measure": "overshoot", "at_most_percent": 10.0},
            {"measure": "settling_time", "at_most_s": 1100.0, "band_percent": 2.0},
            {"measure": "steady_state_error", "input": "step", "at_most": 0.01},
            {"measure": "control_peak", "at_most": 40.0},
        ],
    }
    return {"germination-chamber/germination-chamber.cornerwright.json": project_text(project),
            "germination-chamber/measurements/unit-2.csv": text}
