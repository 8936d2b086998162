#pragma once
#include <deque>
#include <vector>

#include "dropfront/parts/columns.hpp"
#include "dropfront/parts/field_source.hpp"
#include "dropfront/problem/problem.hpp"

namespace dropfront::problem {

/// What slots need to know of one kind of part: its list, the store for derived ones, the reader.
template <class Part>
struct KindTraits {
  parts::Kind kind;
  std::vector<Part> parts::Catalogue::*rows;
  std::deque<Part> DerivedParts::*derived;
  Part (*read)(const parts::FieldSource&, bool inline_part);
  const char* value_column = "";  ///< what a family varies; empty: the kind has no families
};

template <class Part>
inline constexpr KindTraits<Part> kTraits{};

template <>
inline constexpr KindTraits<parts::Dropper> kTraits<parts::Dropper>{
    parts::Kind::dropper, &parts::Catalogue::droppers, &DerivedParts::droppers, parts::read_dropper,
    "capacitance"};
template <>
inline constexpr KindTraits<parts::Resistor> kTraits<parts::Resistor>{
    parts::Kind::resistor, &parts::Catalogue::resistors, &DerivedParts::resistors, parts::read_resistor,
    "resistance"};
template <>
inline constexpr KindTraits<parts::Clamp> kTraits<parts::Clamp>{
    parts::Kind::clamp, &parts::Catalogue::clamps, &DerivedParts::clamps, parts::read_clamp, "voltage"};
template <>
inline constexpr KindTraits<parts::Reservoir> kTraits<parts::Reservoir>{
    parts::Kind::reservoir, &parts::Catalogue::reservoirs, &DerivedParts::reservoirs, parts::read_reservoir,
    "capacitance"};
template <>
inline constexpr KindTraits<parts::Rectifier> kTraits<parts::Rectifier>{
    parts::Kind::rectifier, &parts::Catalogue::rectifiers, &DerivedParts::rectifiers, parts::read_rectifier};
template <>
inline constexpr KindTraits<parts::OutputStage> kTraits<parts::OutputStage>{
    parts::Kind::output_stage, &parts::Catalogue::output_stages, &DerivedParts::output_stages,
    parts::read_output_stage};
template <>
inline constexpr KindTraits<parts::Varistor> kTraits<parts::Varistor>{
    parts::Kind::varistor, &parts::Catalogue::varistors, &DerivedParts::varistors, parts::read_varistor};
template <>
inline constexpr KindTraits<parts::Fuse> kTraits<parts::Fuse>{parts::Kind::fuse, &parts::Catalogue::fuses,
                                                              &DerivedParts::fuses, parts::read_fuse};
template <>
inline constexpr KindTraits<parts::Thyristor> kTraits<parts::Thyristor>{
    parts::Kind::thyristor, &parts::Catalogue::thyristors, &DerivedParts::thyristors, parts::read_thyristor};
template <>
inline constexpr KindTraits<parts::Ceramic> kTraits<parts::Ceramic>{
    parts::Kind::ceramic, &parts::Catalogue::ceramics, &DerivedParts::ceramics, parts::read_ceramic};

}  // namespace dropfront::problem
