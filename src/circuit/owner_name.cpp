#include "dropfront/circuit/owner_name.hpp"

namespace dropfront::circuit {

std::string_view owner_name(Owner owner) {
  switch (owner) {
    case Owner::line:
      return "line";
    case Owner::series_resistor:
      return "series_resistor";
    case Owner::dropper:
      return "dropper";
    case Owner::discharge:
      return "discharge";
    case Owner::clamp:
      return "clamp";
    case Owner::rectifier:
      return "rectifier";
    case Owner::reservoir:
      return "reservoir";
    case Owner::load:
      return "load";
    case Owner::leak:
      return "leak";
    case Owner::thyristor:
      return "thyristor";
    case Owner::gate_resistor:
      return "gate_resistor";
    case Owner::ceramic:
      return "ceramic";
    case Owner::varistor:
      return "varistor";
    case Owner::count:
      break;
  }
  return "other";
}

}  // namespace dropfront::circuit
