#include "dropfront/values/series.hpp"

#include <cmath>
#include <limits>
#include <numeric>

#include "support/catch.hpp"

using namespace dropfront::values;
using Decade = std::vector<int>;

// Decade sums and tables: IEC 60063, as restated, copy not kept; the sums were recomputed from those tables.

TEST_CASE("The decades of the preferred series have their members and sums") {
  CHECK(series_decade(Series::E3) == Decade{10, 22, 47});
  CHECK(series_decade(Series::E6) == Decade{10, 15, 22, 33, 47, 68});
  CHECK(series_decade(Series::E12) == Decade{10, 12, 15, 18, 22, 27, 33, 39, 47, 56, 68, 82});
  CHECK(series_decade(Series::E24) == Decade{10, 11, 12, 13, 15, 16, 18, 20, 22, 24, 27, 30,
                                             33, 36, 39, 43, 47, 51, 56, 62, 68, 75, 82, 91});
  CHECK(series_decade(Series::E48) == Decade{100, 105, 110, 115, 121, 127, 133, 140, 147, 154, 162, 169,
                                             178, 187, 196, 205, 215, 226, 237, 249, 261, 274, 287, 301,
                                             316, 332, 348, 365, 383, 402, 422, 442, 464, 487, 511, 536,
                                             562, 590, 619, 649, 681, 715, 750, 787, 825, 866, 909, 953});
  const auto sum = [](Series series) {
    const Decade& decade = series_decade(series);
    return std::accumulate(decade.begin(), decade.end(), 0);
  };
  CHECK(sum(Series::E24) == 901);
  CHECK(sum(Series::E48) == 18313);
  CHECK(sum(Series::E96) == 37070);
  CHECK(sum(Series::E192) == 74599);
}

TEST_CASE("Exactly eight members of E24 and one of E192 depart from the rounding rule") {
  const auto departures = [](Series series, double scale) {
    Decade found;
    const Decade& decade = series_decade(series);
    for (std::size_t k = 0; k < decade.size(); ++k) {
      const double ideal = scale * std::pow(10.0, double(k) / double(decade.size()));
      if (decade[k] != static_cast<int>(std::lround(ideal))) found.push_back(decade[k]);
    }
    return found;
  };
  CHECK(departures(Series::E24, 10) == Decade{27, 30, 33, 36, 39, 43, 47, 82});
  CHECK(departures(Series::E192, 100) == Decade{920});
  CHECK(departures(Series::E96, 100).empty());
  CHECK(departures(Series::E48, 100).empty());
}

TEST_CASE("Thirteen members of E24 are not in E192") {
  Decade missing;
  const Decade& fine = series_decade(Series::E192);
  for (const int member : series_decade(Series::E24)) {
    if (std::find(fine.begin(), fine.end(), member * 10) == fine.end()) missing.push_back(member);
  }
  CHECK(missing == Decade{22, 27, 30, 33, 36, 39, 43, 51, 56, 62, 68, 82, 91});
}

TEST_CASE("Snapping gives the nearest member and strict neighbours on both sides") {
  CHECK(nearest_preferred(Series::E24, 4950) == 5100);
  CHECK(nearest_preferred(Series::E24, 4899) == 4700);
  CHECK(nearest_preferred(Series::E24, 4900) == 4700);  // a tie goes down
  CHECK(nearest_preferred(Series::E12, 4700) == 4700);
  CHECK(next_lower_preferred(Series::E24, 4700) == 4300);
  CHECK(next_higher_preferred(Series::E24, 4700) == 5100);
  CHECK(next_lower_preferred(Series::E3, 1e-6) == 470e-9);
  CHECK(next_higher_preferred(Series::E3, 4.7e-7) == 1e-6);
  CHECK(nearest_preferred(Series::E6, 9.9e-7) == 1e-6);
  CHECK(nearest_preferred(Series::E192, 9.19) == 9.20);
}

TEST_CASE("Neighbours enclose any value and nothing lies between them") {
  for (int s = 0; s < 7; ++s) {
    const Series series = static_cast<Series>(s);
    for (double value = 1.03e-12; value < 1e9; value *= 1.37) {
      const double low = next_lower_preferred(series, value);
      const double high = next_higher_preferred(series, value);
      REQUIRE(low < value);
      REQUIRE(high > value);
      const auto inside = preferred_between(series, low, high);
      REQUIRE(inside.size() <= 3);  // both ends, and the value itself where it is a member
      REQUIRE(inside.front() == low);
      REQUIRE(inside.back() == high);
      const double nearest = nearest_preferred(series, value);
      REQUIRE(std::fabs(nearest - value) <= std::min(value - low, high - value));
    }
  }
}

TEST_CASE("A range includes its ends and crosses decades") {
  CHECK(preferred_between(Series::E6, 47e-9, 1e-6) ==
        std::vector<double>{47e-9, 68e-9, 100e-9, 150e-9, 220e-9, 330e-9, 470e-9, 680e-9, 1e-6});
  CHECK(preferred_between(Series::E96, 1, 9.999).size() == 96);
  CHECK(preferred_between(Series::E12, 23, 26).empty());
  CHECK(preferred_between(Series::E12, 100, 10).empty());
  CHECK(preferred_between(Series::E12, 0, 10).empty());
  CHECK(preferred_between(Series::E12, 1, std::numeric_limits<double>::infinity()).empty());
}

TEST_CASE("Series are found by name in either case") {
  CHECK(series_named("E24") == Series::E24);
  CHECK(series_named("e192") == Series::E192);
  CHECK_FALSE(series_named("E25"));
  CHECK_FALSE(series_named("24"));
  CHECK(series_name(Series::E48) == "E48");
}

TEST_CASE("A value out of range has no neighbours") {
  for (const double value : {0.0, -1.0, std::nan(""), std::numeric_limits<double>::infinity()}) {
    CHECK(nearest_preferred(Series::E24, value) == 0);
    CHECK(next_lower_preferred(Series::E24, value) == 0);
    CHECK(next_higher_preferred(Series::E24, value) == 0);
  }
}
