// The JSON Schemas of docs/ name the same keys as the reader, and accept and refuse the same files.
#include <algorithm>
#include <set>

#include "dropfront/circuit/arrangement.hpp"
#include "dropfront/parts/columns.hpp"
#include "dropfront/problem/keys.hpp"
#include "problem/schema_validator.hpp"
#include "support/catch.hpp"

using namespace dropfront;
using problem::testing::Json;
using problem::testing::Schemas;

namespace {

const Schemas& schemas() {
  static const Schemas all(std::string(DROPFRONT_SOURCE_DIR) + "/docs");
  return all;
}

std::set<std::string> keys_of(const Json& object) {
  std::set<std::string> keys;
  for (const auto& item : object.items()) keys.insert(item.key());
  return keys;
}

std::set<std::string> words(const Json& list) {
  std::set<std::string> out;
  for (const Json& word : list) out.insert(word.get<std::string>());
  return out;
}

std::set<std::string> set_of(const std::vector<std::string>& list) { return {list.begin(), list.end()}; }

/// The definitions that describe one key set of the reader.
std::vector<Json> definitions(const problem::KeySet& set) {
  const Json& file = schemas().document("problem.schema.json");
  std::string name(set.object);
  std::replace(name.begin(), name.end(), ' ', '_');
  if (name == "problem") return {file};
  if (name == "design") return {schemas().document("design.schema.json")};
  if (name == "spread") return {file["$defs"]["voltage_spread"], file["$defs"]["frequency_spread"]};
  if (name == "range") return {schemas().document("parts.schema.json")["$defs"]["range"]["anyOf"][1]};
  if (problem::keys::slot(set.object) == &set) return {file["$defs"].at("slot_" + name)};
  return {file["$defs"].at(name)};
}

}  // namespace

TEST_CASE("every object of the schemas has the keys the reader takes, required and optional") {
  for (const problem::KeySet* set : problem::keys::every()) {
    for (const Json& definition : definitions(*set)) {
      INFO(set->object);
      CHECK(keys_of(definition.at("properties")) == set_of(set->all()));
      CHECK(words(definition.value("required", Json::array())) == set_of(set->required));
      CHECK(definition.at("additionalProperties") == false);
    }
  }
}

TEST_CASE("every part of the schemas has the columns of its list, and price") {
  const Json& defs = schemas().document("parts.schema.json")["$defs"];
  for (const parts::Kind kind : parts::all_kinds) {
    const std::string name(parts::kind_name(kind));
    INFO(name);
    std::set<std::string> columns = set_of(parts::column_names(kind));
    CHECK(keys_of(defs.at("where_" + name).at("properties")) == columns);
    columns.insert("price");
    const Json& part = defs.at("part_" + name);
    CHECK(keys_of(part.at("properties")) == columns);
    std::set<std::string> needed;
    for (const parts::Column& column : parts::columns_of(kind)) {
      const Json& property = part.at("properties").at(column.name);
      if (column.column_class == parts::ColumnClass::required && column.unless.empty())
        needed.insert(column.name);
      if (!column.required_for.empty()) CHECK(words(part.at("then").at("required")).count(column.name) == 1);
      if (!column.words.empty() && !column.several_words)
        CHECK(words(property.at("enum")) == set_of(column.words));
      if (column.type != parts::ColumnType::number) continue;
      CHECK(property.value(column.range.low_open ? "exclusiveMinimum" : "minimum", -1e300) ==
            column.range.low);
      CHECK(property.value(column.range.high_open ? "exclusiveMaximum" : "maximum", 1e300) ==
            column.range.high);
    }
    CHECK(words(part.value("required", Json::array())) == needed);
  }
}

TEST_CASE("the schema offers the arrangements that are registered") {
  std::set<std::string> names;
  for (const auto& arrangement : circuit::arrangements()) names.emplace(arrangement.name);
  CHECK(words(schemas().document("problem.schema.json")["$defs"]["arrangement"]["enum"]) == names);
}
