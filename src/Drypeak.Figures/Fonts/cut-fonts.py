#!/usr/bin/python3
"""Cuts the fonts of PDF files from the whole ones beside this script.

A PDF holds every font that it uses as a file of its own, whole. Those written here hold the letters that figures
need, so that a figure is a file of less than 60 kB. They are drawn letter by letter, so hints, kerning and
alternatives go too. The names go because the license (LICENSE.txt, condition 3) reserves the original's for the
original; its copyright notice and license stay in the files.

Needs Debian's fonttools (4.38). The same fonts give the same bytes: ./cut-fonts.py
"""

from pathlib import Path

from fontTools import subset
from fontTools.ttLib import TTFont

FAMILY = "Drypeak Cut Sans"

# By Unicode block: references and labels come in any European language, titles mostly in the wording's own.
LATIN = [*range(0x20, 0x7F), *range(0xA0, 0x100)]
EUROPEAN = [*range(0x100, 0x180), *range(0x218, 0x21C), 0x1E9E]
GREEK = [*range(0x391, 0x3CA)]
SIGNS = [ord(sign) for sign in "–—‘’‚“”„…·•⁰¹²³⁴⁵⁶⁷⁸⁹⁻−±×≤≥≈√°‰′″€\u2009\u202F\uFFFD"]
LETTERS = {
    "Regular": LATIN + EUROPEAN + GREEK + SIGNS,
    "SemiBold": LATIN + EUROPEAN + [ord(letter) for letter in "γρ"] + SIGNS,
}

COPYRIGHT, FAMILY_NAME, STYLE, IDENTIFIER, FULL_NAME, VERSION, POSTSCRIPT_NAME, LICENSE, LICENSE_ADDRESS = 0, 1, 2, 3, 4, 5, 6, 13, 14
KEPT = {COPYRIGHT, STYLE, VERSION, LICENSE, LICENSE_ADDRESS}


def cut(style: str, letters: list[int]) -> None:
    folder = Path(__file__).parent
    font = TTFont(folder / f"SourceSans3-{style}.ttf", recalcTimestamp=False)
    options = subset.Options(
        hinting=False, layout_features=[], notdef_outline=True, glyph_names=False, name_IDs=sorted(KEPT),
        name_languages=[0x409], drop_tables=[*subset.Options().drop_tables, "GSUB", "GPOS", "GDEF", "DSIG", "STAT"])
    subsetter = subset.Subsetter(options)
    subsetter.populate(unicodes=letters)
    subsetter.subset(font)
    postscript = f"{FAMILY.replace(' ', '')}-{style}"
    for name, text in {
        FAMILY_NAME: FAMILY, STYLE: style, IDENTIFIER: postscript, FULL_NAME: f"{FAMILY} {style}", POSTSCRIPT_NAME: postscript,
    }.items():
        font["name"].setName(text, name, 3, 1, 0x409)
    font.save(folder / f"Cut-{style}.ttf")


if __name__ == "__main__":
    for style, letters in LETTERS.items():
        cut(style, letters)
