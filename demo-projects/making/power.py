"""The voltage loop of a step-down converter, modelled at three loads."""
import math

from making.parts import project_text, rounded, number

INPUT_V = 48.0
COIL_H, COIL_OHM = 10e-6, 12e-3
CAPACITOR_F, CAPACITOR_OHM = 200e-6, 4e-3
OUTPUT_V = 12.0
GATE_DELAY_S = 80e-9
LOADS_A = [("light load, 1 A", 1.0), ("half load, 6 A", 6.0), ("full load, 15 A", 15.0)]


def stage(load_a):
    """From duty ratio to output voltage, averaged over a switching period (common practice, no
    source): a coil, a capacitor, their resistances and the load's."""
    load = OUTPUT_V / load_a
    both = load + COIL_OHM
    dc = INPUT_V * load / both
    zero = CAPACITOR_OHM * CAPACITOR_F
    first = COIL_H / both + CAPACITOR_F * (CAPACITOR_OHM + load * COIL_OHM / both)
    second = COIL_H * CAPACITOR_F * (load + CAPACITOR_OHM) / both
    dc, zero, first, second = (number(rounded(x)) for x in (dc, zero, first, second))
    return (f"{dc} ({zero} s + 1) / ({second} s^2 + {first} s + 1)"
            f" exp(-{number(GATE_DELAY_S)} s)")


NOTES = (
    "The voltage loop of a 48 V to 12 V step-down converter: duty ratio (0 to 1) to output voltage in"
    " V, modelled at three loads by making/power.py from invented parts: 10 uH with 12 mOhm, 200 uF"
    " with 4 mOhm, 80 ns of gate delay. The controller runs at 250 kHz and needs 1 us to compute.\n\n"
    "The lighter the load, the sharper the resonance of coil and capacitor at 3.6 kHz, and the less"
    " phase margin: the light load falls a little short. Averaged models say nothing about half the switching frequency and above,"
    " nor about the light load once the coil current stops."
)


def converter():
    project = {
        "cornerwright": 1,
        "title": "Converter 48 V to 12 V, voltage loop",
        "notes": NOTES,
        "plant_cases": [{"name": name, "formula": stage(load_a)} for name, load_a in LOADS_A],
        "compensator": [
            {"kind": "gain", "gain": 1500.0},
            {"kind": "integrator"},
            {"kind": "complex_zeros", "corner_rad_s": 22000.0, "damping": 0.42,
             "label": "against coil and capacitor"},
            {"kind": "real_pole", "pole_rad_s": 700000.0},
            {"kind": "real_pole", "pole_rad_s": 700000.0},
        ],
        "sampling": {"sample_period_s": 4e-6, "computation_delay_s": 1e-6,
                     "design_includes_hold": True},
        "realisation": {"method": "tustin", "structure": "direct_form_2_transposed",
                        "number_format": {"type": "float32"}},
        "requirements": [
            {"measure": "phase_margin", "at_least_deg": 55.0},
            {"measure": "gain_margin", "at_least_db": 8.0},
            {"measure": "sensitivity_peak", "at_most_db": 4.0},
            {"measure": "bandwidth", "at_least_rad_s": 60000.0},
            {"measure": "disturbance_rejection", "up_to_rad_s": 6000.0, "at_most_db": -20.0},
            {"measure": "overshoot", "at_most_percent": 25.0},
            {"measure": "settling_time", "at_most_s": 0.0002, "band_percent": 2.0},
            {"measure": "steady_state_error", "input": "step", "at_most": 0.001},
        ],
    }
    return {"converter-48-12/converter-48-12.cornerwright.json": project_text(project)}
