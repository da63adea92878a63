"""Checks layout files and says what is wrong with each; for a batch or before plans are handed in.

    python python-examples/check_layouts.py house.layout.json …

Exit status: 0 when nothing breaks the code, 1 when something does, 2 when a file cannot be read or sized.
Findings support, and do not replace, the local code in force, the authority and a licensed practitioner.
"""

import sys
from pathlib import Path

import dwv


def check(path: Path) -> int:
    """Prints what was found in one file; one bad file does not stop the others."""
    try:
        sizing = dwv.size(path)
    except (OSError, dwv.DwvError) as error:
        print(error)
        return 2
    print(f"{path}: {sizing.summary.name}, {sizing.summary.load:g} FU at the sewer, {len(sizing.findings)} findings")
    for finding in sizing.findings:
        print(f"  {finding.severity}: {finding.message} ({finding.clause}); {finding.remedy}")
    return int(any(finding.severity == "violation" for finding in sizing.findings))


if __name__ == "__main__":
    sys.exit(max((check(Path(name)) for name in sys.argv[1:]), default=0))
