"""How far the tip of one arm stands from that of another at the same joint values, by NumPy from the URDF text, as a witness that shares no
code with the product.

Reads {"files": [two paths], "base", "tip", "joints" (order of a configuration), "configurations"} from standard input as JSON; answers
{"distances", "angles", "percentiles": [of distances, of angles]}. Rotations are products of matrix exponentials by scaling and squaring; the
angle between two of them is 2·asin(|R1 − R2| / (2·√2)) with the Frobenius norm."""

import json
import sys
import xml.etree.ElementTree as xml

import numpy


def cross_matrix(v):
    return numpy.array([[0, -v[2], v[1]], [v[2], 0, -v[0]], [-v[1], v[0], 0]])


def turn(axis, angle):
    small = cross_matrix(numpy.asarray(axis, dtype=float) * angle) / 2**12
    power, total = numpy.eye(3), numpy.eye(3)
    for order in range(1, 8):
        power = power @ small / order
        total = total + power
    for _ in range(12):
        total = total @ total
    return total


def numbers(element, name, fallback):
    text = None if element is None else element.get(name)
    return numpy.array([float(word) for word in text.split()]) if text else numpy.array(fallback, dtype=float)


def frame(rotation, position):
    whole = numpy.eye(4)
    whole[:3, :3], whole[:3, 3] = rotation, position
    return whole


def path_of(file, base, tip):
    carried_by = {joint.find("child").get("link"): joint for joint in xml.parse(file).getroot().findall("joint")}
    path = []
    while tip != base:
        path.append(carried_by[tip])
        tip = carried_by[tip].find("parent").get("link")
    return path[::-1]


def place(path, values):
    whole = numpy.eye(4)
    for joint in path:
        roll, pitch, yaw = numbers(joint.find("origin"), "rpy", (0, 0, 0))
        rotation = turn((0, 0, 1), yaw) @ turn((0, 1, 0), pitch) @ turn((1, 0, 0), roll)
        whole = whole @ frame(rotation, numbers(joint.find("origin"), "xyz", (0, 0, 0)))
        axis = numbers(joint.find("axis"), "xyz", (1, 0, 0))
        value = values.get(joint.get("name"), 0.0)
        if joint.get("type") in ("revolute", "continuous"):
            whole = whole @ frame(turn(axis / numpy.linalg.norm(axis), value), numpy.zeros(3))
        elif joint.get("type") == "prismatic":
            whole = whole @ frame(numpy.eye(3), axis / numpy.linalg.norm(axis) * value)
    return whole


asked = json.load(sys.stdin)
paths = [path_of(file, asked["base"], asked["tip"]) for file in asked["files"]]
distances, angles = [], []
for configuration in asked["configurations"]:
    values = dict(zip(asked["joints"], configuration))
    one, other = (place(path, values) for path in paths)
    distances.append(float(numpy.linalg.norm(one[:3, 3] - other[:3, 3])))
    angles.append(float(2 * numpy.arcsin(numpy.linalg.norm(one[:3, :3] - other[:3, :3]) / (2 * 2**0.5))))
percentiles = [float(numpy.percentile(values, 95, method="inverted_cdf")) for values in (distances, angles)]
json.dump({"distances": distances, "angles": angles, "percentiles": percentiles}, sys.stdout)
