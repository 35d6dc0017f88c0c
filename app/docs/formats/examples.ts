/** Requests for records as the page shows them, executed by tests/api/formats-page.test.ts. revision: the address of a revision of the
 *  demo's Skerry 7, of seven joints. */
export const FORMAT_EXAMPLES = {
  csv: (revision: string) => `curl -sS ${revision}/forward-kinematics \\
  -H "Authorization: Bearer $ELBOWROOM_KEY" \\
  -H "Content-Type: application/json" \\
  -H "Accept: text/csv" \\
  -d '{"configurations": [[0, -0.6, 0, 1.2, 0, 0.8, 0]], "include": ["pose", "withinLimits"]}'`,

  binary: (revision: string) => `curl -sS -D fields.txt -o rates.bin \\
  "${revision}/joint-rates?question=%7B%22include%22:%5B%22rates%22,%22scale%22%5D%7D" \\
  -H "Authorization: Bearer $ELBOWROOM_KEY" \\
  -H "Content-Type: application/octet-stream" \\
  -H "Accept: application/octet-stream" \\
  --data-binary @records.bin`,

  python: (revision: string) => `import array
import json
import os
import sys
import urllib.parse
import urllib.request

REVISION = "${revision}"


def little(values):
    """Numbers as they travel: little-endian, whatever this machine is."""
    if sys.byteorder == "big":
        values.byteswap()
    return values


def ask(operation, records, **question):
    """records: lists of numbers; the answer: its layout as [(path, count)], and one list of numbers a record."""
    query = urllib.parse.urlencode({"question": json.dumps(question)})
    request = urllib.request.Request(
        f"{REVISION}/{operation}?{query}",
        little(array.array("d", [value for record in records for value in record])).tobytes(),
        {
            "Authorization": "Bearer " + os.environ["ELBOWROOM_KEY"],
            "Content-Type": "application/octet-stream",
            "Accept": "application/octet-stream",
        },
    )
    with urllib.request.urlopen(request, timeout=10) as answer:
        layout = []
        for column in answer.headers["Record-Layout"].split(", "):
            path, *given = column.split(";")
            sizes = dict(part.split("=") for part in given if "=" in part)
            count = 1
            for name in ("length", "planes", "rows", "columns"):
                count *= int(sizes.get(name, 1))
            layout.append((path, count))
        values = little(array.array("d", answer.read()))
    width = sum(count for _, count in layout)
    return layout, [list(values[at:at + width]) for at in range(0, len(values), width)]


q = [0.0, -0.6, 0.0, 1.2, 0.0, 0.8, 0.0]
twist = [0.05, 0.0, 0.0, 0.0, 0.0, 0.0]
layout, answers = ask("joint-rates", [q + twist, q + twist], include=["rates", "scale", "diagnosis"])
for answer in answers:
    rates, scale, diagnosis = answer[:7], answer[7], int(answer[8])
    if diagnosis & 1:  # direction-lost: the first of the codes in the layout
        rates = [0.0] * 7
    print("rates", rates, "scale", scale)
`,
} as const
