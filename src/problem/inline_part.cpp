#include "dropfront/problem/inline_part.hpp"

#include <algorithm>

#include "dropfront/problem/scalars.hpp"

namespace dropfront::problem {

InlinePart::InlinePart(const Cursor& object, parts::Kind kind, std::vector<std::string> hidden)
    : object_(object), kind_(kind), hidden_(std::move(hidden)) {
  if (object.node().kind != Node::Kind::object) throw object.wrong("a part as an object {} of columns");
}

std::optional<std::size_t> InlinePart::index_of(std::string_view column) const {
  const auto& keys = object_.node().keys;
  if (std::find(hidden_.begin(), hidden_.end(), column) != hidden_.end()) return std::nullopt;
  for (std::size_t i = 0; i < keys.size(); ++i) {
    if (keys[i].name == column) return i;
  }
  return std::nullopt;
}

std::optional<parts::RawField> InlinePart::find(std::string_view column) const {
  const auto index = index_of(column);
  if (!index) return std::nullopt;
  const Cursor value = object_.member(*index);
  const Node& node = value.node();
  const parts::Column* known = parts::find_column(kind_, column);
  const parts::ColumnType type = known ? known->type : parts::ColumnType::number;  // `price` is no column
  if (type == parts::ColumnType::truth) return parts::RawField{read_truth(value) ? "true" : "false", false};
  if (type == parts::ColumnType::word) return parts::RawField{read_text(value), false};
  if (node.kind == Node::Kind::number) return parts::RawField{node.text, true};
  if (node.kind == Node::Kind::text && !node.text.empty()) return parts::RawField{node.text, false};
  throw value.wrong("a number or a text with unit");
}

std::vector<std::string> InlinePart::names() const {
  std::vector<std::string> out;
  for (const Node::Key& key : object_.node().keys) {
    if (std::find(hidden_.begin(), hidden_.end(), key.name) == hidden_.end()) out.push_back(key.name);
  }
  return out;
}

values::InputError InlinePart::error(std::string_view column, const std::string& message) const {
  const auto index = index_of(column);
  return index ? object_.member(*index).error(message) : object_.error(message);
}

}  // namespace dropfront::problem
