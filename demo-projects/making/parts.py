"""Models, noisy measurements and project text for the demo projects."""
import hashlib
import math

import numpy as np


def rounded(value, digits=6):
    return float(f"{value:.{digits - 1}e}")


def number(value):
    """Shortest text that reads back as the same number, as the program itself saves it."""
    value = float(value)
    scientific = next(text for digits in range(17)
                      if float(text := f"{value:.{digits}e}") == value)
    return min(np.format_float_positional(value, trim="-"), scientific, key=len)


def json_text(value):
    if isinstance(value, bool):
        return "true" if value else "false"
    if isinstance(value, str):
        return '"' + value.replace("\\", "\\\\").replace('"', '\\"').replace("\n", "\\n") + '"'
    if isinstance(value, dict):
        return "{" + ", ".join(f"{json_text(k)}: {json_text(v)}" for k, v in value.items()) + "}"
    if isinstance(value, (list, tuple)):
        return "[" + ", ".join(map(json_text, value)) + "]"
    return number(value)


def project_text(project):
    """A line for every case, section and requirement, as the program itself saves it."""
    def member(value):
        if isinstance(value, list):
            return "[\n    " + ",\n    ".join(map(json_text, value)) + "\n  ]"
        return json_text(value)
    lines = [f"  {json_text(key)}: {member(value)}" for key, value in project.items()]
    return "{\n" + ",\n".join(lines) + "\n}\n"


def root_pair(w, damping):
    """The upper and lower root of s^2 + 2 damping w s + w^2."""
    real, imag = rounded(-damping * w), rounded(w * math.sqrt(1.0 - damping * damping))
    return [[real, imag], [real, -imag]]


def response(model, w):
    """Of {"zeros_rad_s", "poles_rad_s", "gain", "dead_time_s"} at every w in rad/s."""
    s = 1j * w
    value = model["gain"] * np.exp(-s * model["dead_time_s"])
    for real, imag in model["zeros_rad_s"]:
        value = value * (s - complex(real, imag))
    for real, imag in model["poles_rad_s"]:
        value = value / (s - complex(real, imag))
    return value


def measured(truth, floor, averages, seed):
    """Response and coherence as `averages` averaged spectra would give them over a noise `floor` at
    the output. Random error of an averaged response: J. S. Bendat, A. G. Piersol, Random Data,
    chapter 9 (citation from memory). Coherence stays below 0.9998, as converters allow."""
    power = np.abs(truth) ** 2
    coherence = np.minimum(power / (power + floor ** 2), 0.9998)
    spread = np.sqrt((1.0 - coherence) / (2.0 * averages * coherence))
    noise = np.random.default_rng(seed).standard_normal((2, len(truth)))
    return truth * (1.0 + spread * (noise[0] + 1j * noise[1])), coherence


def misfit_db(model, w, values, coherence):
    """20 lg(1 + weighted rms of the relative error), weights from the coherence as in the program."""
    weight = coherence / (1.0 - coherence)
    error = np.abs(response(model, w) / values - 1.0) ** 2
    return 20.0 * math.log10(1.0 + math.sqrt(np.sum(weight * error) / np.sum(weight)))


def stated(lines):
    return "".join(f"# {line}\n" for line in lines)


def sha256(text):
    return hashlib.sha256(text.encode()).hexdigest()
