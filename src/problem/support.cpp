#include "dropfront/problem/support.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "dropfront/problem/scalars.hpp"
#include "dropfront/scoring/check_table.hpp"
#include "dropfront/values/suggest.hpp"

namespace dropfront::problem {

bool checks(std::string_view id) {
  for (const scoring::CheckRule& rule : scoring::check_table()) {
    if (rule.id == id || (id.back() == '.' && rule.id.substr(0, id.size()) == id)) return true;
  }
  return false;
}

const circuit::Arrangement* read_arrangement(const Cursor& cursor) {
  const std::string name = read_text(cursor);
  if (const circuit::Arrangement* found = circuit::find_arrangement(name)) return found;
  std::vector<std::string> offered;
  for (const circuit::Arrangement& arrangement : circuit::arrangements())
    offered.emplace_back(arrangement.name);
  throw cursor.error(
      fmt::format("found \"{}\"{}; allowed: {}", name, values::did_you_mean(name, offered), either(offered)));
}

void caution_unchecked(const std::string& key, bool present, bool checked,
                       std::vector<std::string>& cautions) {
  if (present && !checked)
    cautions.push_back(key + ": no check of this version uses it; it adds cost and size only");
}

}  // namespace dropfront::problem
