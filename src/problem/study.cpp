#include "dropfront/problem/study.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <charconv>
#include <set>
#include <stdexcept>

#include "dropfront/problem/cursor.hpp"
#include "dropfront/problem/scalars.hpp"

namespace dropfront::problem {
namespace {

constexpr std::size_t kMostCombinations = 1000;

/// The entry of a list called `segment`, by index or by its "name".
Node* entry_of(Node& list, const std::string& segment) {
  std::size_t index = 0;
  const auto [end, fault] = std::from_chars(segment.data(), segment.data() + segment.size(), index);
  if (fault == std::errc() && end == segment.data() + segment.size() && index < list.items.size()) {
    return &list.items[index];
  }
  for (Node& item : list.items) {
    const Node* name = item.find("name");
    if (name && name->kind == Node::Kind::text && name->text == segment) return &item;
  }
  return nullptr;
}

Node& member_of(Node& object, const std::string& key, Place place) {
  if (Node* found = object.find(key)) return *found;
  object.keys.push_back({key, place});
  Node empty;
  empty.kind = Node::Kind::object;
  empty.place = place;
  object.items.push_back(std::move(empty));
  return object.items.back();
}

void forget_places(Node& node) {
  node.place = {};
  for (Node::Key& key : node.keys) key.place = {};
  for (Node& item : node.items) forget_places(item);
}

Node set_value(const std::string& text, const std::string& file) {
  const bool structured = !text.empty() && (text[0] == '{' || text[0] == '[' || text[0] == '"');
  try {
    return parse_document(text, file);
  } catch (const values::InputError&) {
    if (structured) throw;
    return text_node(text, {});
  }
}

void remove_member(Node& object, std::string_view key) {
  for (std::size_t i = 0; i < object.keys.size(); ++i) {
    if (object.keys[i].name != key) continue;
    object.keys.erase(object.keys.begin() + static_cast<std::ptrdiff_t>(i));
    object.items.erase(object.items.begin() + static_cast<std::ptrdiff_t>(i));
    return;
  }
}

struct Axis {
  std::string key;
  std::vector<Cursor> values;
};

std::vector<Axis> read_axes(const Cursor& vary) {
  const Node& node = vary.node();
  if (node.kind != Node::Kind::object || node.keys.empty()) {
    throw vary.wrong("an object {} of dotted keys, each with a list of values");
  }
  std::vector<Axis> axes;
  std::size_t combinations = 1;
  for (std::size_t i = 0; i < node.keys.size(); ++i) {
    Axis axis{node.keys[i].name, read_list(vary.member(i), "values")};
    if (axis.key == "vary" || axis.key.rfind("vary.", 0) == 0) {
      throw vary.error_at(node.keys[i].place, "a study cannot vary itself");
    }
    std::set<std::string> seen;
    for (const Cursor& value : axis.values) {
      if (!seen.insert(canonical_json(value.node())).second)
        throw value.error("found twice; allowed: each value once");
    }
    combinations *= axis.values.size();
    if (combinations > kMostCombinations) {
      throw vary.error(fmt::format("found more than {} combinations; split the study", kMostCombinations));
    }
    axes.push_back(std::move(axis));
  }
  return axes;
}

}  // namespace

void put(Node& root, const std::string& key, const Node& value) {
  Node* at = &root;
  std::string done, rest = key;
  for (;;) {
    if (rest.empty() || rest.front() == '.') throw std::invalid_argument("a part of the dotted key is empty");
    // Derating keys hold a dot themselves; any other member may be named in full as well.
    const bool whole = done == "derating" || (at->kind == Node::Kind::object && at->find(rest));
    const std::size_t dot = whole ? std::string::npos : rest.find('.');
    const std::string segment = rest.substr(0, dot);
    if (at->kind == Node::Kind::list) {
      Node* entry = entry_of(*at, segment);
      if (!entry) {
        throw std::invalid_argument(
            fmt::format("{} has {} entries and none is called \"{}\"", done, at->items.size(), segment));
      }
      at = entry;
    } else if (at->kind == Node::Kind::object) {
      at = &member_of(*at, segment, value.place);
    } else {
      throw std::invalid_argument(fmt::format("{} is {}, which holds no keys", done, describe(*at)));
    }
    done += (done.empty() ? "" : ".") + segment;
    if (dot == std::string::npos) break;
    rest = rest.substr(dot + 1);
  }
  *at = value;
}

void apply_set(Node& root, const std::string& assignment, const std::string& file) {
  const std::string place = "--set " + assignment;
  const std::size_t equals = assignment.find('=');
  if (equals == std::string::npos || equals == 0) {
    throw values::InputError(file, place, "allowed: key=value, such as output.voltage=5");
  }
  const std::string key = assignment.substr(0, equals);
  Node value = set_value(assignment.substr(equals + 1), file + ": " + place);
  forget_places(value);
  if (root.kind != Node::Kind::object) return;  // the reader says so, with its place
  try {
    put(root, key, value);
  } catch (const std::invalid_argument& error) {
    throw values::InputError(file, place, error.what());
  }
  Node* vary = root.find("vary");
  if (!vary || !vary->find(key)) return;
  remove_member(*vary, key);
  if (vary->keys.empty()) remove_member(root, "vary");
}

std::vector<Combination> expand_study(const Node& root, const std::string& file) {
  Combination plain{root, {}};
  const auto position =
      std::find_if(root.keys.begin(), root.keys.end(), [](const auto& k) { return k.name == "vary"; });
  if (position == root.keys.end()) return {plain};
  remove_member(plain.root, "vary");
  const Cursor vary = Cursor(root, file).member(static_cast<std::size_t>(position - root.keys.begin()));
  std::vector<Combination> all{plain};
  for (const Axis& axis : read_axes(vary)) {
    std::vector<Combination> longer;
    for (const Combination& so_far : all) {
      for (const Cursor& value : axis.values) {
        Combination next = so_far;
        const Node& node = value.node();
        next.variation.emplace_back(axis.key,
                                    node.kind == Node::Kind::text ? node.text : canonical_json(node));
        try {
          put(next.root, axis.key, node);
        } catch (const std::invalid_argument& error) {
          throw value.error(error.what());
        }
        longer.push_back(std::move(next));
      }
    }
    all = std::move(longer);
  }
  return all;
}

}  // namespace dropfront::problem
