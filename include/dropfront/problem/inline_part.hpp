#pragma once
#include <string>
#include <vector>

#include "dropfront/parts/columns.hpp"
#include "dropfront/parts/field_source.hpp"
#include "dropfront/problem/cursor.hpp"

namespace dropfront::problem {

/// An inline object as the part readers want it: numbers as JSON numbers or texts with unit, yes/no columns
/// as true or false, words as texts. `hidden` names keys that are not columns and that the caller reads
/// itself (the element count of a discharge chain).
class InlinePart : public parts::FieldSource {
 public:
  InlinePart(const Cursor& object, parts::Kind kind, std::vector<std::string> hidden = {});

  std::optional<parts::RawField> find(std::string_view column) const override;
  std::vector<std::string> names() const override;
  values::InputError error(std::string_view column, const std::string& message) const override;

 private:
  std::optional<std::size_t> index_of(std::string_view column) const;

  Cursor object_;
  parts::Kind kind_;
  std::vector<std::string> hidden_;
};

}  // namespace dropfront::problem
