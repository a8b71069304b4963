"""
Builds the wheel with the standard library alone (PEP 517), so that installing needs no network and no build tool.

pip calls ``build_wheel``; metadata follow the core metadata specification 2.1.
"""

import base64
import hashlib
import os
import re
import zipfile

FOLDER = os.path.dirname(os.path.abspath(__file__))
SUMMARY = "Client of the Rhoform API: DC resistances with bounds, from shapes and materials."


def _text(name):
    with open(os.path.join(FOLDER, name), encoding="utf-8") as file:
        return file.read()


def _version():
    found = re.search(r'^__version__ = "([^"]+)"$', _text("rhoform.py"), re.MULTILINE)
    if found is None:
        raise RuntimeError("rhoform.py tells no version.")
    return found.group(1)


def build_wheel(wheel_directory, config_settings=None, metadata_directory=None):
    version = _version()
    info = f"rhoform-{version}.dist-info"
    metadata = (
        f"Metadata-Version: 2.1\nName: rhoform\nVersion: {version}\nSummary: {SUMMARY}\n"
        f"Requires-Python: >=3.9\nDescription-Content-Type: text/markdown\n\n{_text('README.md')}"
    )
    files = {
        "rhoform.py": _text("rhoform.py"),
        f"{info}/METADATA": metadata,
        f"{info}/WHEEL": "Wheel-Version: 1.0\nGenerator: rhoform\nRoot-Is-Purelib: true\nTag: py3-none-any\n",
        f"{info}/entry_points.txt": "[console_scripts]\nrhoform = rhoform:main\n",
    }
    record = []
    name = f"rhoform-{version}-py3-none-any.whl"
    with zipfile.ZipFile(os.path.join(wheel_directory, name), "w", zipfile.ZIP_DEFLATED) as wheel:
        for path, text in files.items():
            content = text.encode("utf-8")
            digest = base64.urlsafe_b64encode(hashlib.sha256(content).digest()).rstrip(b"=").decode()
            record.append(f"{path},sha256={digest},{len(content)}")
            wheel.writestr(path, content)
        wheel.writestr(f"{info}/RECORD", "\n".join(record + [f"{info}/RECORD,,", ""]))
    return name
