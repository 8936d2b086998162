#pragma once
#include <fmt/format.h>

#include <string>
#include <vector>

#include "dropfront/problem/inline_part.hpp"
#include "dropfront/problem/part_kinds.hpp"
#include "dropfront/values/suggest.hpp"

namespace dropfront::problem {

/// The row or derived part of that name, or null.
template <class Part>
const Part* find_part(const Problem& problem, std::string_view name) {
  for (const Part& part : (*problem.catalogue).*kTraits<Part>.rows) {
    if (part.info.name == name) return &part;
  }
  for (const Part& part : (*problem.derived).*kTraits<Part>.derived) {
    if (part.info.name == name) return &part;
  }
  return nullptr;
}

/// The part of that name; refused with the nearest known name.
template <class Part>
const Part* require_part(const Cursor& cursor, const std::string& name, const Problem& problem) {
  if (const Part* part = find_part<Part>(problem, name)) return part;
  std::vector<std::string> known;
  for (const Part& part : (*problem.catalogue).*kTraits<Part>.rows) known.push_back(part.info.name);
  const auto file = parts::list_file_name(kTraits<Part>.kind);
  if (known.empty()) throw cursor.error(fmt::format("found \"{}\"; the parts lists hold no {}", name, file));
  throw cursor.error(fmt::format("found \"{}\"{}; allowed: a part of {}, such as \"{}\"", name,
                                 values::did_you_mean(name, known), file, known.front()));
}

/// A part as written in "only" or in a design file: a name, or an inline object (kept in the derived parts).
template <class Part>
const Part* read_part(const Cursor& cursor, Problem& problem, const std::vector<std::string>& hidden = {}) {
  const Node& node = cursor.node();
  if (node.kind == Node::Kind::text) return require_part<Part>(cursor, node.text, problem);
  if (node.kind != Node::Kind::object) throw cursor.wrong("a part's name or an object {} of columns");
  auto& store = (*problem.derived).*kTraits<Part>.derived;
  store.push_back(kTraits<Part>.read(InlinePart(cursor, kTraits<Part>.kind, hidden), true));
  std::string& name = store.back().info.name;
  if (name.empty()) name = fmt::format("inline {} {}", parts::kind_name(kTraits<Part>.kind), store.size());
  return &store.back();
}

}  // namespace dropfront::problem
