"""Forward kinematics, Jacobian and weighted damped rates by Orocos KDL, as a witness that shares no code with the product.

Reads one question from standard input as JSON: either one object or {"questions": [...]}, each with file, base, tip, joints (names in the
order of a configuration), configurations, and perhaps "damped": {"lambda", "weights" (of joints), "twists"}.
Answers {"transforms": [12 numbers each, row-major 3 x 4], "jacobians": [6 x n each, rows vx vy vz wx wy wz], "rates": [n each]}.
It reads URDF by itself, with Python's own XML reader; base must lie above tip in the tree. KDL does not know mimics: they are folded here,
and damped rates are only given for chains without them."""

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


def damped_rates(chain, count, asked, values, twist):
    # KDL scales lambda by how far the smallest singular value is below eps: from a huge one on it is taken as it is.
    solver = kdl.ChainIkSolverVel_wdls(chain, 1e9)
    solver.setLambda(asked["lambda"])
    solver.setWeightJS([[asked["weights"][i] ** -0.5 if i == k else 0.0 for k in range(count)] for i in range(count)])
    rates = kdl.JntArray(count)
    status = solver.CartToJnt(values, kdl.Twist(kdl.Vector(*twist[:3]), kdl.Vector(*twist[3:])), rates)
    if status < 0:
        raise SystemExit("KDL refused to damp")
    return [rates[i] for i in range(count)]


def answer(question):
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
    transforms, jacobians, rates = [], [], []
    for number, configuration in enumerate(question["configurations"]):
        values = kdl.JntArray(count)
        for i, (column, multiplier, offset) in enumerate(follows):
            values[i] = multiplier * configuration[column] + offset
        frame, whole = kdl.Frame(), kdl.Jacobian(count)
        if position_solver.JntToCart(values, frame) < 0 or jacobian_solver.JntToJac(values, whole) < 0:
            raise SystemExit("KDL refused the chain")
        transforms.append([entry for row in range(3) for entry in [*(frame.M[row, k] for k in range(3)), frame.p[row]]])
        folded = [[0.0] * len(question["joints"]) for _ in range(6)]
        for i, (column, multiplier, _) in enumerate(follows):
            for row in range(6):
                folded[row][column] += multiplier * whole[row, i]
        jacobians.append([entry for row in folded for entry in row])
        if "damped" in question:
            rates.append(damped_rates(chain, count, question["damped"], values, question["damped"]["twists"][number]))
    return {"transforms": transforms, "jacobians": jacobians, "rates": rates}


def main():
    asked = json.load(sys.stdin)
    whole = [answer(question) for question in asked["questions"]] if "questions" in asked else answer(asked)
    json.dump(whole, sys.stdout)


main()
