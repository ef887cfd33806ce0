"""The library prints nothing, does not end the program, and reads no clock, locale or environment."""
import re

from faults import finish, line_of, place, text_files

HEADERS = r"#\s*include\s*<(?:iostream|print|clocale|locale|ctime|time\.h|csignal)>"
NAMES = (r"std::(?:cout|cerr|clog|cin|locale|print|println|time|clock|mktime|localtime|gmtime)\b"
         r"|std::chrono::\w*clock\b|fmt::print\w*"
         r"|\b(?:getenv|secure_getenv|setenv|putenv|setlocale|localeconv|isatty)\b"
         r"|(?<![\w.>])(?:std::)?(?:exit|_Exit|quick_exit|abort|terminate|printf|fprintf|puts|fputs|putchar|perror|clock|time)\s*\("
         r"|\b(?:stdout|stderr|stdin)\b")
FORBIDDEN = re.compile(f"{HEADERS}|{NAMES}")
COMMENT_OR_TEXT = re.compile(r'//[^\n]*|/\*.*?\*/|R"(\w*)\(.*?\)\1"|"(?:[^"\\\n]|\\.)*"', re.DOTALL)


def code_only(text):
    """The text with comments and string literals blanked; `#include "..."` goes with them."""
    return COMMENT_OR_TEXT.sub(lambda match: re.sub(r"[^\n]", " ", match[0]), text)


faults = []
files = list(text_files("lib/isohydric", ".hpp", ".cpp"))
for path, text in files:
    for found in FORBIDDEN.finditer(code_only(text)):
        faults.append(f"{place(path, line_of(text, found.start()))}: {found[0]} is not for the library")
finish(faults, len(files), "files")
