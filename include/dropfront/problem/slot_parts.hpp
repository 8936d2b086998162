#pragma once
#include <algorithm>
#include <type_traits>

#include "dropfront/parts/family.hpp"
#include "dropfront/problem/named_part.hpp"
#include "dropfront/problem/part_filter.hpp"
#include "dropfront/problem/scalars.hpp"

namespace dropfront::problem {

template <class Part>
inline constexpr bool kHasFamily =
    std::is_same_v<Part, parts::Dropper> || std::is_same_v<Part, parts::Resistor> ||
    std::is_same_v<Part, parts::Clamp> || std::is_same_v<Part, parts::Reservoir>;

/// Rows of a slot's list that may serve it.
template <class Part>
std::vector<const Part*> usable_rows(const Problem& problem, bool (*usable)(const Part&)) {
  std::vector<const Part*> rows;
  for (const Part& part : (*problem.catalogue).*kTraits<Part>.rows) {
    if (usable(part)) rows.push_back(&part);
  }
  return rows;
}

/// "series", "from", "to", "like": all four or none. Members join the derived parts, ascending in value.
template <class Part>
std::vector<const Part*> read_family(ObjectReader& reader, Problem& problem, bool (*usable)(const Part&)) {
  std::vector<const Part*> members;
  const auto series = reader.take("series");
  const auto from = reader.take("from"), to = reader.take("to"), like = reader.take("like");
  if (!series && !from && !to && !like) return members;
  if (!series || !from || !to || !like) {
    throw reader.object().error("a family needs \"series\", \"from\", \"to\" and \"like\" together");
  }
  const auto which = values::series_named(values::series_names()[read_word(*series, values::series_names())]);
  const values::Unit unit = parts::find_column(kTraits<Part>.kind, kTraits<Part>.value_column)->unit;
  const double low = read_quantity(*from, unit, kPositive), high = read_quantity(*to, unit, kPositive);
  if (!(low <= high)) throw to->error(fmt::format("found less than \"from\"; allowed: from <= to"));
  if (!(high <= low * 1e9)) throw to->error("found more than 1e9 times \"from\"");
  std::vector<const Part*> rows;
  for (const Cursor& entry : read_one_or_list(*like, "part names")) {
    rows.push_back(require_part<Part>(entry, read_text(entry), problem));
    if (!usable(*rows.back())) throw entry.error("this row's column `slots` does not name this slot");
  }
  auto& store = (*problem.derived).*kTraits<Part>.derived;
  for (Part& part : parts::expand_family(rows, *which, low, high)) {
    store.push_back(std::move(part));
    members.push_back(&store.back());
  }
  if (members.empty()) throw series->error("no value of this series lies between \"from\" and \"to\"");
  return members;
}

/// What a slot offers: "only" (else all usable rows, unless a family is asked for) and the family, then
/// "where" and "except". Order: rows as read, family ascending, inline objects as written.
template <class Part>
std::vector<const Part*> read_slot_parts(ObjectReader& reader, Problem& problem,
                                         bool (*usable)(const Part&)) {
  std::vector<const Part*> rows = usable_rows(problem, usable), inlined, family;
  if constexpr (kHasFamily<Part>) family = read_family(reader, problem, usable);
  if (const auto only = reader.take("only")) {
    std::vector<const Part*> named;
    for (const Cursor& entry : read_one_or_list(*only, "part names or objects {} of columns")) {
      const Part* part = read_part<Part>(entry, problem);
      const bool by_name = entry.node().kind == Node::Kind::text;
      if (by_name && !usable(*part)) throw entry.error("this row's column `slots` does not name this slot");
      (by_name ? named : inlined).push_back(part);
    }
    const auto unnamed = [&](const Part* part) {
      return std::find(named.begin(), named.end(), part) == named.end();
    };
    rows.erase(std::remove_if(rows.begin(), rows.end(), unnamed), rows.end());
  } else if (!family.empty()) {
    rows.clear();
  }
  std::vector<const Part*> all = rows;
  all.insert(all.end(), family.begin(), family.end());
  all.insert(all.end(), inlined.begin(), inlined.end());
  if (const auto where = reader.take("where")) {
    const auto conditions = read_where(*where, kTraits<Part>.kind);
    const auto fails = [&](const Part* part) {
      return !std::all_of(conditions.begin(), conditions.end(), [&](const Condition& condition) {
        return meets(condition, parts::column_value(*part, condition.column->name));
      });
    };
    all.erase(std::remove_if(all.begin(), all.end(), fails), all.end());
    if (all.empty()) throw where->error("no part of this slot meets these conditions");
  }
  if (const auto except = reader.take("except")) {
    for (const Cursor& entry : read_one_or_list(*except, "part names")) {
      const Part* out = require_part<Part>(entry, read_text(entry), problem);
      all.erase(std::remove(all.begin(), all.end(), out), all.end());
    }
    if (all.empty()) throw except->error("no part of this slot is left");
  }
  return all;
}

}  // namespace dropfront::problem
