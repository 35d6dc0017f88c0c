"""Forward kinematics and Jacobian by Orocos KDL, as a witness that shares no code with the product.

Reads one question from standard input as JSON: file, base, tip, joints (names in the order of a configuration), configurations.
Prints {"transforms": [12 numbers each, row-major 3 x 4], "jacobians": [6 x n each, rows vx vy vz wx wy wz]}.
It reads URDF by itself, with Python's own XML reader; base must lie above tip in the tree."""

import json
import sys
import xml.etree.ElementTree as xml

import PyKDL as kdl


def numbers(text, fallback):
    return [float(word) for word in text.split()] if text else list(fallback)


def attribute(joint, child, name):
    element = joint.find(child)
    return None if element is None else element.get(name)


def read(path):
    """Joints by the link that they carry, and by name."""
    carried_by, named = {}, {}
    for joint in xml.parse(path).getroot().findall("joint"):
        carried_by[attribute(joint, "child", "link")] = joint
        named[joint.get("name")] = joint
    return carried_by, named


def path_down(carried_by, base, tip):
    path, link = [], tip
    while link != base:
        path.append(carried_by[link])
        link = attribute(carried_by[link], "parent", "link")
    return path[::-1]


def expand(named, joint):
    """(name of the joint that leads, multiplier, offset), through mimics of mimics."""
    mimic = joint.find("mimic")
    if mimic is None:
        return joint.get("name"), 1.0, 0.0
    leader, multiplier, offset = expand(named, named[mimic.get("joint")])
    own = float(mimic.get("multiplier", "1"))
    return leader, own * multiplier, own * offset + float(mimic.get("offset", "0"))


def segment(joint):
    roll, pitch, yaw = numbers(attribute(joint, "origin", "rpy"), (0, 0, 0))
    origin = kdl.Frame(kdl.Rotation.RPY(roll, pitch, yaw), kdl.Vector(*numbers(attribute(joint, "origin", "xyz"), (0, 0, 0))))
    axis = origin.M * kdl.Vector(*numbers(attribute(joint, "axis", "xyz"), (1, 0, 0)))
    kinds = {"revolute": kdl.Joint.RotAxis, "continuous": kdl.Joint.RotAxis, "prismatic": kdl.Joint.TransAxis}
    kind = kinds.get(joint.get("type"))
    moving = kdl.Joint(joint.get("name"), kdl.Joint.Fixed) if kind is None else kdl.Joint(joint.get("name"), origin.p, axis, kind)
    return kdl.Segment(attribute(joint, "child", "link"), moving, origin), kind is not None


def main():
    question = json.load(sys.stdin)
    carried_by, named = read(question["file"])
    chain, follows = kdl.Chain(), []
    for joint in path_down(carried_by, question["base"], question["tip"]):
        piece, moves = segment(joint)
        chain.addSegment(piece)
        if moves:
            leader, multiplier, offset = expand(named, joint)
            follows.append((question["joints"].index(leader), multiplier, offset))

    count = len(follows)
    position_solver, jacobian_solver = kdl.ChainFkSolverPos_recursive(chain), kdl.ChainJntToJacSolver(chain)
    transforms, jacobians = [], []
    for configuration in question["configurations"]:
        values = kdl.JntArray(count)
        for i, (column, multiplier, offset) in enumerate(follows):
            values[i] = multiplier * configuration[column] + offset
        frame, whole = kdl.Frame(), kdl.Jacobian(count)
        if position_solver.JntToCart(values, frame) < 0 or jacobian_solver.JntToJac(values, whole) < 0:
            raise SystemExit("KDL refused the chain")
        transforms.append([number for row in range(3) for number in [*(frame.M[row, k] for k in range(3)), frame.p[row]]])
        folded = [[0.0] * len(question["joints"]) for _ in range(6)]
        for i, (column, multiplier, _) in enumerate(follows):
            for row in range(6):
                folded[row][column] += multiplier * whole[row, i]
        jacobians.append([number for row in folded for number in row])
    json.dump({"transforms": transforms, "jacobians": jacobians}, sys.stdout)


main()
