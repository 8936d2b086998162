#pragma once
#include <concepts>
#include <cstdint>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace dropfront::report {

/// Shortest decimal text that reads back as the same double; "null" for a number that is not finite.
std::string exact_text(double value);

/// Writes one JSON document in the order it is told: fixed keys, shortest round-trip numbers, no NaN.
/// `lines` containers put each member on a line of its own, `flat` ones stay on one line with all they hold.
class JsonWriter {
 public:
  enum class Layout { lines, flat };

  void begin_object(Layout layout = Layout::lines) { open('{', layout); }
  void end_object() { close('}'); }
  void begin_array(Layout layout = Layout::lines) { open('[', layout); }
  void end_array() { close(']'); }
  void key(std::string_view name);

  void value(double number) { item(exact_text(number)); }
  void value(bool truth) { item(truth ? "true" : "false"); }
  void value(std::integral auto number) { item(std::to_string(number)); }
  void value(std::string_view text) { item(quoted(text)); }
  void value(const char* text) { value(std::string_view(text)); }
  void value(const std::string& text) { value(std::string_view(text)); }
  void null() { item("null"); }
  template <typename T>
  void value(const std::optional<T>& maybe) {
    maybe ? value(*maybe) : null();
  }
  /// A finished JSON document as one value; its line breaks are indented to the place. Must be valid JSON.
  void document(std::string_view json);

  /// key(name) then value(v).
  template <typename T>
  void member(std::string_view name, const T& v) {
    key(name);
    value(v);
  }

  /// The document, ended by a line break. Call once, after the last container is closed.
  std::string take();

  static std::string quoted(std::string_view text);

 private:
  struct Level {
    Layout layout;
    bool empty = true;
  };
  void open(char bracket, Layout layout);
  void close(char bracket);
  void item(std::string_view text);
  void separate();
  bool flat() const { return !levels_.empty() && levels_.back().layout == Layout::flat; }
  void new_line();

  std::string text_;
  std::vector<Level> levels_;
  bool after_key_ = false;
};

}  // namespace dropfront::report
