#include "dropfront/report/csv_writer.hpp"

#include <limits>

#include "support/catch.hpp"

namespace dropfront::report {
namespace {

// Quoting rules: RFC 4180, section 2, rules 5 to 7.
TEST_CASE("cells with commas, quotes and line breaks are quoted, quotes doubled") {
  CsvWriter csv({"a", "b,c"});
  csv.cell("say \"no\"").cell("two\nlines");
  csv.end_row();
  CHECK(csv.take() == "a,\"b,c\"\n\"say \"\"no\"\"\",\"two\nlines\"\n");
}

TEST_CASE("absent numbers and numbers that are not finite are empty cells") {
  CsvWriter csv({"x", "y", "z"});
  csv.cell(std::optional<double>{}).cell(std::numeric_limits<double>::quiet_NaN()).cell(0.1);
  csv.end_row();
  CHECK(csv.take() == "x,y,z\n,,0.1\n");
}

}  // namespace
}  // namespace dropfront::report
