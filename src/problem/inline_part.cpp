#include "dropfront/problem/inline_part.hpp"

#include <algorithm>

namespace dropfront::problem {

InlinePart::InlinePart(const Cursor& object, std::vector<std::string> hidden)
    : object_(object), hidden_(std::move(hidden)) {
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
  switch (node.kind) {
    case Node::Kind::text:
      if (node.text.empty())
        throw value.error("found an empty text; leave the key out if the figure is not known");
      return parts::RawField{node.text, false};
    case Node::Kind::number:
      return parts::RawField{node.text, true};
    case Node::Kind::boolean:
      return parts::RawField{node.boolean ? "true" : "false", false};
    case Node::Kind::null:
    case Node::Kind::list:
    case Node::Kind::object:
      break;
  }
  throw value.wrong("a number, a text with unit, true or false");
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
