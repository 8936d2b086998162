#include "dropfront/problem/input_hash.hpp"

#include "support/catch.hpp"

// Source: the test vectors of draft-eastlake-fnv for the 64-bit FNV-1a hash [from memory].
TEST_CASE("the 64-bit FNV-1a hash gives its published test vectors") {
  CHECK(dropfront::problem::fnv1a_64("") == "cbf29ce484222325");
  CHECK(dropfront::problem::fnv1a_64("a") == "af63dc4c8601ec8c");
  CHECK(dropfront::problem::fnv1a_64("foobar") == "85944171f73967e8");
}
