// Just enough of JSON Schema 2020-12 to hold the files of docs/ against the reader. An unknown keyword fails
// loudly, so that the schemas cannot grow beyond what is evaluated here.
#pragma once
#include <fstream>
#include <map>
#include <nlohmann/json.hpp>
#include <regex>
#include <set>
#include <stdexcept>
#include <string>

namespace dropfront::problem::testing {

using Json = nlohmann::ordered_json;

class Schemas {
 public:
  explicit Schemas(const std::string& folder) {
    for (const char* name : {"problem.schema.json", "parts.schema.json", "design.schema.json"}) {
      std::ifstream file(folder + "/" + name);
      documents_[name] = Json::parse(file);
    }
  }

  const Json& document(const std::string& name) const { return documents_.at(name); }
  bool accepts(const std::string& name, const Json& value) const {
    return valid(documents_.at(name), value, name);
  }

 private:
  static bool is(const Json& value, const std::string& type) {
    if (type == "object") return value.is_object();
    if (type == "array") return value.is_array();
    if (type == "string") return value.is_string();
    if (type == "boolean") return value.is_boolean();
    if (type == "number") return value.is_number();
    if (type == "integer") {
      return value.is_number_integer() ||
             (value.is_number() && value.get<double>() == static_cast<double>(value.get<long long>()));
    }
    throw std::logic_error("type not evaluated: " + type);
  }

  bool valid(const Json& schema, const Json& value, const std::string& home) const {
    for (const auto& item : schema.items()) {
      if (!keyword(item.key(), item.value(), schema, value, home)) return false;
    }
    return true;
  }

  bool any(const Json& schemas, const Json& value, const std::string& home) const {
    for (const Json& schema : schemas) {
      if (valid(schema, value, home)) return true;
    }
    return false;
  }

  bool keyword(const std::string& key, const Json& rule, const Json& schema, const Json& value,
               const std::string& home) const {
    static const std::set<std::string> silent{"$schema", "title", "description", "x-cross-field-rules",
                                              "$defs",   "then"};
    if (silent.count(key)) return true;
    if (key == "$ref") {
      const std::string ref = rule.get<std::string>();
      const auto hash = ref.find('#');
      const std::string file = hash == 0 ? home : ref.substr(0, hash);
      return valid(documents_.at(file).at(Json::json_pointer(ref.substr(hash + 1))), value, file);
    }
    if (key == "type") {
      if (rule.is_string()) return is(value, rule);
      for (const Json& type : rule) {
        if (is(value, type)) return true;
      }
      return false;
    }
    if (key == "enum") return std::find(rule.begin(), rule.end(), value) != rule.end();
    if (key == "const") return value == rule;
    if (key == "not") return !valid(rule, value, home);
    if (key == "anyOf") return any(rule, value, home);
    if (key == "allOf") {
      for (const Json& part : rule) {
        if (!valid(part, value, home)) return false;
      }
      return true;
    }
    if (key == "if") return !valid(rule, value, home) || valid(schema.at("then"), value, home);
    if (value.is_number()) {
      const double number = value;
      if (key == "minimum") return number >= rule.get<double>();
      if (key == "maximum") return number <= rule.get<double>();
      if (key == "exclusiveMinimum") return number > rule.get<double>();
      if (key == "exclusiveMaximum") return number < rule.get<double>();
    }
    if (value.is_string()) {
      if (key == "minLength") return !value.get<std::string>().empty();
      if (key == "pattern")
        return std::regex_search(value.get<std::string>(), std::regex(rule.get<std::string>()));
    }
    if (value.is_array()) {
      if (key == "minItems") return value.size() >= rule.get<std::size_t>();
      if (key == "uniqueItems") return std::set<Json>(value.begin(), value.end()).size() == value.size();
      if (key == "items") {
        for (const Json& entry : value) {
          if (!valid(rule, entry, home)) return false;
        }
        return true;
      }
    }
    if (value.is_object()) return object_keyword(key, rule, schema, value, home);
    static const std::set<std::string> known{"minimum",          "maximum",       "exclusiveMinimum",
                                             "exclusiveMaximum", "minLength",     "pattern",
                                             "minItems",         "uniqueItems",   "items",
                                             "properties",       "required",      "additionalProperties",
                                             "propertyNames",    "minProperties", "dependentRequired"};
    if (!known.count(key)) throw std::logic_error("keyword not evaluated: " + key);
    return true;
  }

  bool object_keyword(const std::string& key, const Json& rule, const Json& schema, const Json& value,
                      const std::string& home) const {
    if (key == "minProperties") return value.size() >= rule.get<std::size_t>();
    if (key == "required") {
      for (const Json& name : rule) {
        if (!value.contains(name.get<std::string>())) return false;
      }
      return true;
    }
    if (key == "dependentRequired") {
      for (const auto& item : rule.items()) {
        if (!value.contains(item.key())) continue;
        for (const Json& name : item.value()) {
          if (!value.contains(name.get<std::string>())) return false;
        }
      }
      return true;
    }
    for (const auto& member : value.items()) {
      const bool named = schema.contains("properties") && schema["properties"].contains(member.key());
      if (key == "properties" && named && !valid(rule.at(member.key()), member.value(), home)) return false;
      if (key == "propertyNames" && !valid(rule, member.key(), home)) return false;
      if (key != "additionalProperties" || named) continue;
      if (rule == false || (rule.is_object() && !valid(rule, member.value(), home))) return false;
    }
    return true;
  }

  std::map<std::string, Json> documents_;
};

}  // namespace dropfront::problem::testing
