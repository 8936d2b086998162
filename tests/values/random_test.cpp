#include "dropfront/values/random.hpp"

#include <cmath>
#include <set>
#include <vector>

#include "support/catch.hpp"

using namespace dropfront::values;

TEST_CASE("SplitMix64 gives the outputs of its public reference for seed 1234567") {
  // Outputs as listed for the public-domain reference, from memory.
  std::uint64_t state = 1234567;
  for (const std::uint64_t expected : {6457827717110365317ULL, 3203168211198807973ULL, 9817491932198370423ULL,
                                       4593380528125082431ULL, 16408922859458223821ULL}) {
    CHECK(splitmix64(state) == expected);
  }
}

TEST_CASE("xoshiro256** gives the outputs of its public reference from state 1 2 3 4") {
  // Outputs as listed for the public-domain reference, from memory; the first two follow by hand:
  // rotl(2·5, 7)·9 = 11520 and rotl(0·5, 7)·9 = 0.
  RandomStream stream(RandomStream::State{1, 2, 3, 4});
  for (const std::uint64_t expected : {11520ULL, 0ULL, 1509978240ULL, 1215971899390074240ULL,
                                       1216172134540287360ULL, 607988272756665600ULL}) {
    CHECK(stream.next() == expected);
  }
}

TEST_CASE("Uniform numbers fill the unit interval with the moments of the uniform law") {
  RandomStream stream(1);
  const int n = 100000;
  double sum = 0, squares = 0;
  std::vector<int> bins(10);
  for (int i = 0; i < n; ++i) {
    const double u = stream.uniform01();
    REQUIRE(u >= 0);
    REQUIRE(u < 1);
    sum += u;
    squares += u * u;
    ++bins[static_cast<int>(u * 10)];
  }
  // Five standard deviations: sqrt(1/12/n) of the mean, sqrt(4/45/n) of the second moment.
  CHECK_THAT(sum / n, Catch::Matchers::WithinAbs(0.5, 5 * std::sqrt(1.0 / 12 / n)));
  CHECK_THAT(squares / n, Catch::Matchers::WithinAbs(1.0 / 3, 5 * std::sqrt(4.0 / 45 / n)));
  double chi2 = 0;
  for (const int count : bins) chi2 += std::pow(count - n / 10.0, 2) / (n / 10.0);
  CHECK(chi2 < 27.9);  // chi-squared, 9 degrees of freedom, 0.1 % tail
}

TEST_CASE("Whole numbers below n are all met and none beyond") {
  RandomStream stream(7);
  std::vector<int> counts(6);
  for (int i = 0; i < 6000; ++i) ++counts.at(stream.below(6));
  for (const int count : counts) CHECK(std::abs(count - 1000) < 150);  // 5 standard deviations of 29
  CHECK(stream.below(1) == 0);
  CHECK(stream.below(0) == 0);
}

TEST_CASE("Split streams depend on seed and index alone and differ from each other") {
  RandomStream fresh(42);
  RandomStream used(42);
  for (int i = 0; i < 10; ++i) used.next();
  CHECK(fresh.split(3).next() == used.split(3).next());
  std::set<std::uint64_t> firsts;
  for (std::uint64_t seed = 0; seed < 10; ++seed) {
    for (std::uint64_t index = 0; index < 1000; ++index)
      firsts.insert(RandomStream(seed).split(index).next());
  }
  CHECK(firsts.size() == 10000);  // a 64-bit collision among 1e4 has chance 3e-12
}

TEST_CASE("Two neighbouring split streams are uncorrelated") {
  const RandomStream root(9);
  RandomStream a = root.split(0);
  RandomStream b = root.split(1);
  const int n = 20000;
  double sum = 0;
  for (int i = 0; i < n; ++i) sum += (a.uniform01() - 0.5) * (b.uniform01() - 0.5);
  CHECK_THAT(sum / n, Catch::Matchers::WithinAbs(0, 5.0 / 12 / std::sqrt(n)));  // 5 standard deviations
}
