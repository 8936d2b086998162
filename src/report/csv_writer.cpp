#include "dropfront/report/csv_writer.hpp"

#include <cmath>

#include "dropfront/values/number_text.hpp"

namespace dropfront::report {

CsvWriter::CsvWriter(const std::vector<std::string>& header) {
  for (const auto& name : header) cell(name);
  end_row();
}

CsvWriter& CsvWriter::cell(std::string_view text) {
  if (!row_empty_) text_ += ',';
  row_empty_ = false;
  if (text.find_first_of(",\"\r\n") == std::string_view::npos) {
    text_ += text;
    return *this;
  }
  text_ += '"';
  for (const char c : text) {
    if (c == '"') text_ += '"';
    text_ += c;
  }
  text_ += '"';
  return *this;
}

CsvWriter& CsvWriter::cell(double number) {
  const std::string text = std::isfinite(number) ? values::number_text(number) : "";
  return cell(std::string_view(text));
}

CsvWriter& CsvWriter::cell(const std::optional<double>& number) {
  return number ? cell(*number) : cell(std::string_view());
}

void CsvWriter::end_row() {
  text_ += '\n';
  row_empty_ = true;
}

}  // namespace dropfront::report
