#include "dropfront/parts/csv.hpp"

#include "support/catch.hpp"

namespace dropfront::parts {
namespace {

using Texts = std::vector<std::vector<std::string>>;

Texts texts(const std::string& csv) {
  Texts rows;
  for (const CsvRow& row : parse_csv(csv, "list.csv")) {
    rows.emplace_back();
    for (const CsvCell& cell : row) rows.back().push_back(cell.text);
  }
  return rows;
}

std::string refusal(const std::string& csv) {
  try {
    parse_csv(csv, "list.csv");
  } catch (const values::InputError& error) {
    return error.what();
  }
  return "accepted";
}

TEST_CASE("The examples of RFC 4180 section 2 read as described there") {
  CHECK(texts("aaa,bbb,ccc\r\nzzz,yyy,xxx\r\n") == Texts{{"aaa", "bbb", "ccc"}, {"zzz", "yyy", "xxx"}});
  CHECK(texts("aaa,bbb,ccc\r\nzzz,yyy,xxx") == Texts{{"aaa", "bbb", "ccc"}, {"zzz", "yyy", "xxx"}});
  CHECK(texts("\"aaa\",\"bbb\",\"ccc\"\r\nzzz,yyy,xxx") ==
        Texts{{"aaa", "bbb", "ccc"}, {"zzz", "yyy", "xxx"}});
  CHECK(texts("\"aaa\",\"b\r\nbb\",\"ccc\"\r\nzzz,yyy,xxx") ==
        Texts{{"aaa", "b\r\nbb", "ccc"}, {"zzz", "yyy", "xxx"}});
  CHECK(texts("\"aaa\",\"b\"\"bb\",\"ccc\"") == Texts{{"aaa", "b\"bb", "ccc"}});
}

TEST_CASE("Lists written by hand read as meant") {
  CHECK(texts("\xef\xbb\xbfpart,value\n# a remark, with comma\n\n  x , 1 \n   \ny,\n") ==
        Texts{{"part", "value"}, {"x", "1"}, {"y", ""}});
  CHECK(texts("a,b\n\"#1\",\" kept \"\n") == Texts{{"a", "b"}, {"#1", " kept "}});
  CHECK(texts("").empty());
  CHECK(texts("# only a remark").empty());
}

TEST_CASE("Places of cells count lines and characters") {
  const auto rows = parse_csv("part,µ-value,z\n\"two\nlines\",  2 µF,3\nlast,4,5\n", "list.csv");
  REQUIRE(rows.size() == 3);
  CHECK(rows[0][2].column == 14);
  CHECK(rows[1][1].line == 3);
  CHECK(rows[1][1].column == 10);
  CHECK(rows[1][2].column == 15);
  CHECK(rows[2][0].line == 4);
}

TEST_CASE("Malformed rows are refused at their place") {
  CHECK(refusal("a,b\n1\n") == "list.csv:2:1: the row has 1 cells, the first row has 2");
  CHECK(refusal("a,b\n1,2,3\n") == "list.csv:2:1: the row has 3 cells, the first row has 2");
  CHECK(refusal("a,b\n1,\"2\n") == "list.csv:2:3: a cell opens with a quote that is never closed");
  CHECK(refusal("a,b\n1,2\"\n") == "list.csv:2:4: a quote stands inside a cell that does not begin with one");
  CHECK(refusal("a,b\n\"1\"x,2\n") == "list.csv:2:4: text stands behind a closing quote");
}

TEST_CASE("A row answers for its columns and points at the cell") {
  const std::string file = "list.csv";
  const auto rows = parse_csv("part,value,note\nx,5,\n", file);
  const CsvPart part(file, rows[0], rows[1]);
  CHECK(part.find("value")->text == "5");
  CHECK_FALSE(part.find("note"));
  CHECK_FALSE(part.find("absent"));
  CHECK(part.names() == std::vector<std::string>{"part", "value", "note"});
  CHECK(std::string(part.error("value", "wrong").what()) == "list.csv:2:3: wrong");
  CHECK(std::string(part.error("absent", "wrong").what()) == "list.csv:2:1: wrong");
}

}  // namespace
}  // namespace dropfront::parts
