"""A belt axis of a gantry that transplants seedlings, measured with four loads on the carriage."""
import math

import numpy as np

from making.parts import (measured, misfit_db, project_text, response, root_pair, rounded, sha256,
                          stated)

MOTOR_KG = 9.0          # rotor and pulleys, as a mass at the belt
BELT_N_PER_M = 534e3
FRICTION_N_S_PER_M = 70.0
FORCE_N_PER_A = 55.0
DEAD_TIME_S = 0.0004    # current loop and encoder filter
MM_PER_M = 1000.0
POINTS, FROM_HZ, TO_HZ, AVERAGES = 800, 0.3, 900.0, 24
FLOOR_MM_PER_A = 2e-5

LOADS = [  # name, file, carriage and load in kg, damping of the belt, has a fit
    ("empty tray", "empty-tray", 5.0, 0.028, True),
    ("half tray", "half-tray", 9.0, 0.030, True),
    ("full tray", "full-tray", 14.0, 0.032, True),
    ("wet substrate", "wet-substrate", 20.0, 0.034, False),
]


def axis(load_kg, damping):
    """From motor current in A to motor position in mm: two masses and a belt between them."""
    total = MOTOR_KG + load_kg
    lag = FRICTION_N_S_PER_M / total
    dip = math.sqrt(BELT_N_PER_M / load_kg)
    peak = dip * math.sqrt(total / MOTOR_KG)
    return {"zeros_rad_s": root_pair(dip, 0.8 * damping),
            "poles_rad_s": [[0, 0], [rounded(-lag), 0]] + root_pair(peak, damping),
            "gain": rounded(FORCE_N_PER_A / MOTOR_KG * MM_PER_M), "dead_time_s": DEAD_TIME_S}


def heading(name, load_kg, damping, seed):
    return stated([
        f"Seedling gantry, traverse axis, load: {name}. Invented; no real machine was measured.",
        "From motor current (A) to motor position (mm). The plant behind these figures:",
        "  P(s) = 1000 F / (s (M s + b)) * (s^2/wz^2 + 2 z1 s/wz + 1) / (s^2/wp^2 + 2 z2 s/wp + 1)"
        " * exp(-T s)",
        f"  with F {FORCE_N_PER_A:g} N/A, M {MOTOR_KG + load_kg:g} kg, b {FRICTION_N_S_PER_M:g} N s/m,"
        f" T {DEAD_TIME_S:g} s, z1 {0.8 * damping:g}, z2 {damping:g},",
        f"  wz from a belt of {BELT_N_PER_M:g} N/m and a load of {load_kg:g} kg, wp the same with the"
        f" {MOTOR_KG:g} kg of the motor.",
        f"Noise of {AVERAGES} averaged spectra over a floor of {FLOOR_MM_PER_A:g} mm/A, seed {seed}.",
    ])


def measurement(name, load_kg, damping, seed):
    """Text of the file, and the generator's own model with its misfit."""
    model = axis(load_kg, damping)
    f = np.array([rounded(x) for x in np.geomspace(FROM_HZ, TO_HZ, POINTS)])
    w = 2.0 * math.pi * f
    values, coherence = measured(response(model, w), FLOOR_MM_PER_A, AVERAGES, seed)
    rows = [f"{x:g},{20 * math.log10(abs(v)):.4f},{math.degrees(np.angle(v)):.3f},{c:.5f}\n"
            for x, v, c in zip(f, values, coherence)]
    text = (heading(name, load_kg, damping, seed)
            + "Frequency (Hz),Magnitude (dB),Phase (deg),Coherence\n" + "".join(rows))
    return text, {**model, "misfit_db": rounded(misfit_db(model, w, values, coherence), 3)}


def plant_cases(files):
    for seed, (name, file, load_kg, damping, has_fit) in enumerate(LOADS, start=101):
        text, fit = measurement(name, load_kg, damping, seed)
        files[f"seedling-gantry/measurements/{file}.csv"] = text
        case = {"name": name,
                "measurement": {"file": f"measurements/{file}.csv", "sha256": sha256(text)},
                "integrators": 1, "unstable_poles": 0}
        yield {**case, "fit": fit} if has_fit else case


NOTES = (
    "A belt axis of a gantry that transplants seedlings: motor current in A to motor position in mm,"
    " with four loads on the carriage. The belt's resonance falls from 65 Hz to 47 Hz as the load"
    " grows.\n\nInvented: the four measurements were computed by making/gantry.py from the plant that"
    " each file states in its first lines, with seeded noise. The fit of the first three cases is that"
    " stated plant, not one that was fitted to the points. The fourth case has no fit on purpose:"
    " what needs a model of it, such as the overshoot, is \"not determined\" until one is fitted.\n\n"
    "The lighter loads meet every requirement; with the heaviest the bandwidth falls a little short."
    " Half a decibel more gain mends it, before the sensitivity peak of the lightest stands in the way."
)


def seedling_gantry():
    files = {}
    project = {
        "cornerwright": 1,
        "title": "Seedling gantry, traverse axis",
        "notes": NOTES,
        "plant_cases": list(plant_cases(files)),
        "compensator": [
            {"kind": "gain", "gain": 0.29},
            {"kind": "pi", "corner_rad_s": 1.5},
            {"kind": "lead", "zero_rad_s": 19.0, "pole_rad_s": 400.0, "label": "phase lift"},
            {"kind": "notch", "corner_rad_s": 300.0, "zero_damping": 0.06, "pole_damping": 0.35,
             "label": "belt, heavy loads"},
            {"kind": "notch", "corner_rad_s": 375.0, "zero_damping": 0.08, "pole_damping": 0.45,
             "label": "belt, light loads"},
            {"kind": "real_pole", "pole_rad_s": 2500.0, "label": "roll-off"},
        ],
        "sampling": {"sample_period_s": 0.0005, "computation_delay_s": 0.0001,
                     "design_includes_hold": True},
        "realisation": {"method": "tustin_at_corners", "structure": "direct_form_2_transposed",
                        "number_format": {"type": "fixed", "word_bits": 32, "fraction_bits": 22}},
        "requirements": [
            {"measure": "phase_margin", "at_least_deg": 45.0},
            {"measure": "gain_margin", "at_least_db": 8.0},
            {"measure": "sensitivity_peak", "at_most_db": 4.0},
            {"measure": "bandwidth", "at_least_rad_s": 53.4},
            {"measure": "roll_off", "from_rad_s": 250.0, "at_most_db": -9.0},
            {"measure": "disturbance_rejection", "up_to_rad_s": 4.0, "at_most_db": -20.0},
            {"measure": "overshoot", "at_most_percent": 30.0},
            {"measure": "settling_time", "at_most_s": 0.25, "band_percent": 2.0},
        ],
    }
    files["seedling-gantry/seedling-gantry.cornerwright.json"] = project_text(project)
    return files
