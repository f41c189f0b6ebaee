"""Which aperture does a flash in a softbox give, and what do two guns make together?

Usage: EVENFALL_KEY=evenfall_server_... python3 examples/python/two_guns.py
Needs Python 3 and nothing else.
"""

import json
import os
import urllib.error
import urllib.request

URL = os.environ.get("EVENFALL_URL", "http://127.0.0.1:4310")
KEY = os.environ["EVENFALL_KEY"]


def call(path, body):
    request = urllib.request.Request(
        f"{URL}/v1/{path}",
        data=json.dumps(body).encode(),
        headers={"Authorization": f"Bearer {KEY}", "Content-Type": "application/json"},
    )
    try:
        with urllib.request.urlopen(request, timeout=10) as response:
            return json.load(response)
    except urllib.error.HTTPError as error:
        problem = json.load(error)
        raise SystemExit(f"{problem['code']}: {problem['detail']}") from None


softbox = {"guideNumberM": 50, "lossStops": 1.5, "distanceM": 3, "iso": 200, "power": "1/4"}
together = {"guideNumberM": [36, 22], "distanceM": 5, "iso": 100, "power": 1}

answers = call(
    "batch",
    {"calls": [{"calculator": "flash/exposure", "input": question} for question in (softbox, together)]},
)
for name, answer in zip(("softbox at 3 m", "two guns at 5 m"), answers["results"]):
    aperture = answer["result"]["aperture"]
    print(f"{name}: {aperture['mark']} (exactly f/{aperture['exact']:.2f})")
