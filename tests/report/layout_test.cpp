// How lines are laid out: what the words of a report are does not matter here.
#include "isohydric/report/detail/text_layout.hpp"

#include <doctest/doctest.h>

namespace isohydric::report {

TEST_CASE("layout: a long text is broken at words, and hangs below its first word") {
    TextLayout layout(20);
    layout.item("  1 ", "one two three four five");
    CHECK(layout.take() == "  1 one two three\n    four five\n");
}

TEST_CASE("layout: a line may fill the width and not pass it") {
    TextLayout layout(10);
    layout.item("", "12345 7890 2");
    CHECK(layout.take() == "12345 7890\n2\n");
}

TEST_CASE("layout: a word longer than the width stands alone, whole") {
    TextLayout layout(4);
    layout.item("", "a hydroxybutyrate b");
    CHECK(layout.take() == "a\nhydroxybutyrate\nb\n");
}

TEST_CASE("layout: a UTF-8 character takes one column [@rfc3629, section 3]") {
    CHECK(columns_of("10 \xC2\xB5mol/L") == 9);
    CHECK(columns_of("37 \xC2\xB0"
                     "C") == 5);
    CHECK(columns_of("") == 0);
    TextLayout layout(40);
    layout.table({{"\xC2\xB5", "a"}, {"m", "b"}}, "");
    CHECK(layout.take() == "\xC2\xB5  a\nm  b\n");
}

TEST_CASE("layout: columns are as wide as their widest cell; no line ends in spaces") {
    TextLayout layout(40);
    layout.table({{"pH", "7.21", "low"}, {"lactate", "6", ""}}, "  ");
    CHECK(layout.take() == "  pH       7.21  low\n  lactate  6\n");
}

TEST_CASE("layout: the last cell of a row is broken at words within its column") {
    TextLayout layout(16);
    layout.table({{"id", "it says something"}}, "  ");
    CHECK(layout.take() == "  id  it says\n      something\n");
}

TEST_CASE("layout: two blocks side by side, the first half to the left") {
    TextLayout layout(20);
    layout.table_side_by_side({{"a", "1"}, {"b", "2"}, {"c", "3"}}, "  ");
    CHECK(layout.take() == "  a  1    c  3\n  b  2\n");
}

TEST_CASE("layout: blocks that do not fit stand one below the other") {
    TextLayout layout(12);
    layout.table_side_by_side({{"a", "1"}, {"b", "2"}}, "  ");
    CHECK(layout.take() == "  a  1\n  b  2\n");
}

TEST_CASE("layout: words are joined without a separator at either end") {
    CHECK(listed({}).empty());
    CHECK(listed({"a"}) == "a");
    CHECK(listed({"a", "b", "c"}) == "a, b, c");
    CHECK(listed({"a", "b"}, "; ") == "a; b");
}

}  // namespace isohydric::report
