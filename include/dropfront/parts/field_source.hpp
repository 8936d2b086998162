#pragma once
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "dropfront/parts/catalogue.hpp"
#include "dropfront/values/input_error.hpp"

namespace dropfront::parts {

/// One value as written: a CSV cell, or a JSON string, number (shortest round-trip text) or true/false.
struct RawField {
  std::string text;
  bool bare_number = false;  ///< a JSON number: already SI (mm, currency and degC for the plain columns)
};

/// One part as someone wrote it: a CSV row or an inline JSON object. The readers below ask it for columns
/// and refuse the names nobody asked for, so both forms follow the same rules and give the same messages.
class FieldSource {
 public:
  virtual ~FieldSource() = default;
  virtual std::optional<RawField> find(std::string_view column) const = 0;  ///< empty cells are absent
  virtual std::vector<std::string> names() const = 0;                       ///< every column present
  /// An error at that column (or at the whole part when `column` is empty).
  virtual values::InputError error(std::string_view column, const std::string& message) const = 0;
};

/// Each reads one part by the column classes of the interface (required, properties with defaults, ratings).
/// `inline_part` accepts `price` and a missing `part` name. Throws InputError through source.error().
Dropper read_dropper(const FieldSource& source, bool inline_part);
Resistor read_resistor(const FieldSource& source, bool inline_part);
Clamp read_clamp(const FieldSource& source, bool inline_part);
Reservoir read_reservoir(const FieldSource& source, bool inline_part);
Rectifier read_rectifier(const FieldSource& source, bool inline_part);
OutputStage read_output_stage(const FieldSource& source, bool inline_part);
Varistor read_varistor(const FieldSource& source, bool inline_part);
Fuse read_fuse(const FieldSource& source, bool inline_part);
Thyristor read_thyristor(const FieldSource& source, bool inline_part);
Ceramic read_ceramic(const FieldSource& source, bool inline_part);

}  // namespace dropfront::parts
