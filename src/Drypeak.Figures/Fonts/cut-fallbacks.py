#!/usr/bin/python3
"""Cuts the fallback fonts from the whole ones of the Noto family (SIL Open Font License 1.1, no reserved names).

For letters that the main font lacks: Arabic, Hebrew, Devanagari and Thai whole, with the tables that join and stack
their letters; of Han the characters of the national standards' first sets, with kana, so that the file stays small.

Needs Debian's fonttools (4.38) and the npm packages @expo-google-fonts/noto-sans-arabic 0.4.3, -hebrew 0.4.1,
-devanagari 0.4.1, -thai 0.4.2 and -sc 0.4.3, unpacked in the folder that is named: ./cut-fallbacks.py FOLDER
"""

import sys
from pathlib import Path

from fontTools import subset
from fontTools.ttLib import TTFont


def of_standard(encoding: str, first: range, second: range) -> set[int]:
    """Characters that a national standard encodes by two bytes in these ranges."""
    found = set()
    for one in first:
        for two in second:
            try:
                found.update(ord(letter) for letter in bytes([one, two]).decode(encoding))
            except UnicodeDecodeError:
                continue
    return found


KANA = set(range(0x3000, 0x3100)) | set(range(0xFF01, 0xFF61))
HAN = (
    KANA
    | of_standard("gb2312", range(0xB0, 0xF8), range(0xA1, 0xFF))  # GB/T 2312: simplified
    | of_standard("shift_jis", range(0x88, 0x99), range(0x40, 0xFD))  # JIS X 0208, level 1: Japanese
    | of_standard("big5", range(0xA4, 0xC7), range(0x40, 0xFF))  # Big5, level 1: traditional
)
FONTS = {"Arabic": None, "Hebrew": None, "Devanagari": None, "Thai": None, "SC": HAN}


def cut(folder: Path, script: str, letters: set[int] | None) -> None:
    [source] = folder.rglob(f"NotoSans{script}_400Regular.ttf")
    font = TTFont(source, recalcTimestamp=False)
    options = subset.Options(hinting=False, layout_features=["*"] if letters is None else [], notdef_outline=True, glyph_names=False,
                             name_IDs=["*"], name_languages=[0x409], drop_tables=[*subset.Options().drop_tables, "DSIG", "STAT"])
    subsetter = subset.Subsetter(options)
    subsetter.populate(unicodes=letters or font.getBestCmap().keys())
    subsetter.subset(font)
    font.save(Path(__file__).parent / f"Fallback-{'Han' if letters else script}.ttf")


if __name__ == "__main__":
    for script, letters in FONTS.items():
        cut(Path(sys.argv[1]), script, letters)
