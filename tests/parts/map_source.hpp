#pragma once
#include <map>
#include <string>
#include <vector>

#include "dropfront/parts/field_source.hpp"

namespace dropfront::parts {

/// A part written as name and text, the shape of an inline object.
class MapSource : public FieldSource {
 public:
  explicit MapSource(std::map<std::string, std::string> fields) : fields_(std::move(fields)) {}

  std::optional<RawField> find(std::string_view column) const override {
    const auto found = fields_.find(std::string(column));
    if (found == fields_.end() || found->second.empty()) return std::nullopt;
    return RawField{found->second, false};
  }
  std::vector<std::string> names() const override {
    std::vector<std::string> names;
    for (const auto& field : fields_) names.push_back(field.first);
    return names;
  }
  values::InputError error(std::string_view column, const std::string& message) const override {
    return {"design.json", std::string(column), message};
  }

  MapSource with(const std::string& name, const std::string& text) const {
    MapSource changed = *this;
    changed.fields_[name] = text;
    return changed;
  }
  MapSource without(const std::string& name) const {
    MapSource changed = *this;
    changed.fields_.erase(name);
    return changed;
  }

 private:
  std::map<std::string, std::string> fields_;
};

inline MapSource part_of(const std::map<std::string, std::string>& fields) { return MapSource(fields); }

/// Message of the refusal, or "accepted".
template <class T>
std::string refusal(T (*read)(const FieldSource&, bool), const FieldSource& source, bool inline_part = true) {
  try {
    read(source, inline_part);
  } catch (const values::InputError& error) {
    return error.what();
  }
  return "accepted";
}

}  // namespace dropfront::parts
