#include "dropfront/parts/part_info.hpp"

#include "support/catch.hpp"

namespace dropfront::parts {
namespace {

TEST_CASE("The price is that of the greatest break within the volume, else the least given") {
  PartInfo part;
  CHECK_FALSE(price_micro_at(part, 1000));
  part.price_breaks = {{100, 300000}, {1000, 200000}, {10000, 150000}};
  CHECK(price_micro_at(part, 1) == 300000);  // no break so small: the least given
  CHECK(price_micro_at(part, 100) == 300000);
  CHECK(price_micro_at(part, 999) == 300000);
  CHECK(price_micro_at(part, 1000) == 200000);
  CHECK(price_micro_at(part, 9999) == 200000);
  CHECK(price_micro_at(part, 1000000) == 150000);
}

}  // namespace
}  // namespace dropfront::parts
