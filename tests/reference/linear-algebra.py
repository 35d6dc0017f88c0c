"""Singular values, projector, least rates and damped rates of matrices by NumPy, as a witness that shares no code with the product.

Reads {"matrices": [[rows]], "asked": [[m]], "damping": λ} from standard input as JSON, answers for each matrix
{"values", "projector" (n x n, rows), "rates" (pinv · asked), "damped"}."""

import json
import sys

import numpy


def answer(matrix, asked, damping):
    a, b = numpy.array(matrix), numpy.array(asked)
    inverse = numpy.linalg.pinv(a, rcond=1e-9)
    n = a.shape[1]
    # Damped least squares as an ordinary one with λ·I below, which numpy solves by its own singular value decomposition.
    stacked = numpy.vstack([a, damping * numpy.eye(n)])
    damped = numpy.linalg.lstsq(stacked, numpy.concatenate([b, numpy.zeros(n)]), rcond=None)[0]
    return {
        "values": numpy.linalg.svd(a, compute_uv=False).tolist(),
        "projector": (numpy.eye(n) - inverse @ a).tolist(),
        "rates": (inverse @ b).tolist(),
        "damped": damped.tolist(),
    }


question = json.load(sys.stdin)
json.dump([answer(*pair, question["damping"]) for pair in zip(question["matrices"], question["asked"])], sys.stdout)
