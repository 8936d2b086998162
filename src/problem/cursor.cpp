#include "dropfront/problem/cursor.hpp"

#include <fmt/format.h>

#include <stdexcept>

#include "dropfront/values/suggest.hpp"

namespace dropfront::problem {
namespace {

/// RFC 6901 section 3: '~' and '/' inside a name.
std::string escaped(std::string_view name) {
  std::string out;
  for (const char c : name) {
    if (c == '~') {
      out += "~0";
    } else if (c == '/') {
      out += "~1";
    } else {
      out += c;
    }
  }
  return out;
}

}  // namespace

Cursor Cursor::member(std::size_t index) const {
  Cursor cursor(node_->items[index], *file_);
  cursor.pointer_ = pointer_ + "/" + escaped(node_->keys[index].name);
  return cursor;
}

Cursor Cursor::item(std::size_t index) const {
  Cursor cursor(node_->items[index], *file_);
  cursor.pointer_ = fmt::format("{}/{}", pointer_, index);
  return cursor;
}

Cursor Cursor::absent_object(std::string_view key) const {
  static const Node empty = [] {
    Node node;
    node.kind = Node::Kind::object;
    return node;
  }();
  Cursor cursor(empty, *file_);
  cursor.place_ = place_;
  cursor.pointer_ = pointer_ + "/" + escaped(key);
  return cursor;
}

std::string Cursor::dotted() const {
  std::string out;
  for (const char c : pointer_) {
    if (c != '/') {
      out += c;
    } else if (!out.empty()) {
      out += '.';
    }
  }
  return out;
}

values::InputError Cursor::error_at(Place place, const std::string& message) const {
  const std::string where =
      place.line > 0 ? fmt::format("{}:{}", place.line, place.column) : std::string("--set");
  return {*file_, pointer_.empty() ? where : where + ": " + pointer_, message};
}

values::InputError Cursor::wrong(const std::string& allowed) const {
  return error(fmt::format("found {}; allowed: {}", describe(*node_), allowed));
}

std::string describe(const Node& node) {
  switch (node.kind) {
    case Node::Kind::null:
      return "null";
    case Node::Kind::boolean:
      return node.boolean ? "true" : "false";
    case Node::Kind::number:
      return "the number " + node.text;
    case Node::Kind::text:
      return "the text \"" + node.text + "\"";
    case Node::Kind::list:
      return node.items.empty() ? "an empty list" : "a list";
    case Node::Kind::object:
      return "an object";
  }
  return "nothing";
}

ObjectReader::ObjectReader(const Cursor& object, const KeySet& keys) : object_(object), keys_(keys) {
  const Node& node = object.node();
  if (node.kind != Node::Kind::object) {
    throw object.wrong(fmt::format("an object {{}} with {}", either(keys.all())));
  }
  for (std::size_t i = 0; i < node.keys.size(); ++i) {
    const Node::Key& key = node.keys[i];
    if (keys.knows(key.name)) continue;
    throw object.error_at(key.place,
                          fmt::format("unknown key \"{}\" in {}{}; allowed: {}", key.name, keys.object,
                                      values::did_you_mean(key.name, keys.all()), either(keys.all())));
  }
  for (const std::string& key : keys.required) {
    if (!has(key)) throw object.error(fmt::format("the key \"{}\" is missing in {}", key, keys.object));
  }
  taken_.resize(node.keys.size());
}

std::optional<Cursor> ObjectReader::take(std::string_view key) {
  if (!keys_.knows(key)) throw std::logic_error("key without an entry in its key set: " + std::string(key));
  const auto& present = object_.node().keys;
  for (std::size_t i = 0; i < present.size(); ++i) {
    if (present[i].name != key) continue;
    taken_[i] = true;
    return object_.member(i);
  }
  return std::nullopt;
}

Cursor ObjectReader::take_object(std::string_view key) {
  const auto cursor = take(key);
  return cursor ? *cursor : object_.absent_object(key);
}

Cursor ObjectReader::require(std::string_view key) {
  const auto cursor = take(key);
  if (!cursor) throw object_.error(fmt::format("the key \"{}\" is missing in {}", key, keys_.object));
  return *cursor;
}

void ObjectReader::finish() const {
  for (std::size_t i = 0; i < taken_.size(); ++i) {
    if (!taken_[i]) throw std::logic_error("key known but never read: " + object_.node().keys[i].name);
  }
}

}  // namespace dropfront::problem
