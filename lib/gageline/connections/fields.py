"""Types of input fields: quantities written with their unit, choices, lists; and one sentence for whatever is wrong with them."""

from contextlib import contextmanager
from typing import Annotated, Any, Literal, get_args, get_origin

from pydantic import BaseModel, BeforeValidator, ConfigDict, Field, Strict, ValidationError

from .. import units
from ..errors import GagelineError, InputError, nearest


class _Quantity:
    """Marks a float field with the display unit that its text is read into."""

    def __init__(self, unit):
        self.unit = unit


def _quantity(unit):
    def reader(value, info):
        return units.read(value, unit, info.field_name)

    return Annotated[float, BeforeValidator(reader, json_schema_input_type=str), _Quantity(unit)]


Length = _quantity("in")
Force = _quantity("kip")
Angle = _quantity("rad")
Number = _quantity("")
Count = Annotated[int, Strict()]


def _texts(value, info):
    if isinstance(value, str):
        return [part.strip() for part in value.split(",") if part.strip()]
    if isinstance(value, (list, tuple)) and all(isinstance(part, str) for part in value):
        return list(value)
    raise InputError(f"{info.field_name} = {value!r}: give texts with units, for example \"3 in, 4 in, 3 in\"")


def _lengths(value, info):
    return [units.read(part, "in", info.field_name) for part in _texts(value, info)]


def _points(value, info):
    if isinstance(value, str):
        value = [part for part in value.split(";") if part.strip()]
    if not isinstance(value, (list, tuple)):
        raise InputError(f"{info.field_name} = {value!r}: give points as \"x, y\" texts with units, separated by semicolons")
    points = []
    for point in value:
        parts = _texts(point, info)
        if len(parts) != 2:
            raise InputError(f"{info.field_name}: {point!r} is not a point; write \"x, y\" with units, for example \"3 in, 1-1/2 in\"")
        points.append(tuple(units.read(part, "in", info.field_name) for part in parts))
    return points


Lengths = Annotated[tuple[float, ...], BeforeValidator(_lengths, json_schema_input_type=str | list[str]), _Quantity("in")]
Points = Annotated[tuple[tuple[float, float], ...], BeforeValidator(_points, json_schema_input_type=str | list[str]), _Quantity("in")]
Texts = Annotated[tuple[str, ...], BeforeValidator(lambda v: [v] if isinstance(v, str) else v, json_schema_input_type=str | list[str])]


def note(text, default: Any = ..., group="", **limits):
    """Return a field with its meaning and the heading it stands under, both printed; ``...`` makes it compulsory."""
    return Field(default, description=text, json_schema_extra={"group": group}, **limits)


class Inputs(BaseModel):
    """Base of a family's inputs: frozen, unknown names refused, every error one sentence."""

    model_config = ConfigDict(frozen=True, extra="forbid", allow_inf_nan=False, strict=False, coerce_numbers_to_str=False)

    @classmethod
    def of(cls, **given):
        """Validate given values and return the inputs.

        Raises
        ------
        InputError
            The first thing wrong, as one sentence with the input's name and what is allowed.
        """
        unknown = [name for name in given if name not in cls.model_fields]
        if unknown:
            raise InputError(f"unknown input {unknown[0]!r}; nearest known inputs: {nearest(unknown[0], cls.model_fields)}")
        try:
            return cls(**given)
        except ValidationError as error:
            raise InputError(_sentence(cls, error.errors()[0])) from None

    def shown(self, system="US"):
        """Return (group, name, meaning, value as text in a system of units, whether given) for every input, in order of definition."""
        return [(field.json_schema_extra["group"], name, field.description, display(getattr(self, name), field, system),
                 name in self.model_fields_set)
                for name, field in type(self).model_fields.items()]


def display(value, field, system="US"):
    """Return an input's value as printed in the inputs table."""
    unit = _unit(field)
    if value is None:
        return "not given"
    if system == "dual" and unit in ("in", "kip") and value != ():
        return f"{display(value, field)} ({display(value, field, 'SI')})"
    if system == "SI" and unit == "in":
        points = [p if isinstance(p, tuple) else (p,) for p in (value if isinstance(value, tuple) else (value,))]
        return "; ".join(", ".join(units.printed(v * 25.4) for v in point) for point in points) + " mm" if points else "none"
    if unit == "rad":
        return f"{value * 57.29577951308232:.4g}°"
    if unit == "in":
        if isinstance(value, tuple):
            return "; ".join(", ".join(units.fraction(v) for v in p) if isinstance(p, tuple) else units.fraction(p) for p in value) + " in" \
                if value else "none"
        return units.fraction(value) + " in" + (f" ({units.feet(value)})" if value >= 24 else "")
    if unit is not None:
        return units.amount(value, unit, system, units.printed)
    if isinstance(value, bool):
        return "yes" if value else "no"
    if isinstance(value, tuple):
        return "; ".join(value) if value else "none"
    return str(value)


def unit_of(inputs, name):
    """Return the display unit of an input that is a quantity, None for others."""
    return _unit(type(inputs).model_fields[name])


def _unit(field):
    """Return the display unit of a quantity field, also where it may be None; None for other fields."""
    marks = [*field.metadata, *(mark for part in get_args(field.annotation) for mark in getattr(part, "__metadata__", ()))]
    return next((mark.unit for mark in marks if isinstance(mark, _Quantity)), None)


def _sentence(cls, error):
    """Turn pydantic's first complaint into one sentence of ours."""
    name = str(error["loc"][0]) if error["loc"] else ""
    cause = error.get("ctx", {}).get("error")
    if isinstance(cause, GagelineError):
        return str(cause)
    if error["type"] == "missing":
        return f"input {name} is missing: {cls.model_fields[name].description}"
    if error["type"] == "literal_error":
        allowed = ", ".join(str(choice) for choice in _choices(cls.model_fields[name].annotation))
        return f"{name} = {error['input']!r} is not allowed; allowed: {allowed}"
    if cause is not None:
        return str(cause)
    words = {"int_parsing": "a whole number", "int_type": "a whole number", "int_from_float": "a whole number", "string_type": "a text in quotes",
             "bool_type": "True or False", "bool_parsing": "True or False", "string_too_short": "a text that is not empty"}
    bounds = {"less_than_equal": ("le", "a number of at most"), "less_than": ("lt", "a number less than"), "greater_than_equal": ("ge", "a number of at least"),
              "greater_than": ("gt", "a number greater than")}
    allowed = words.get(error["type"], error["msg"])
    if error["type"] in bounds:
        key, word = bounds[error["type"]]
        limit, unit = error["ctx"][key], _unit(cls.model_fields[name]) or ""
        limit, unit = (limit * 57.29577951308232, "deg") if unit == "rad" else (limit, unit)
        allowed = f"{word} {f'{limit:,.10g}'.replace(',', ' ')} {unit}".strip()
    return f"{name} = {error['input']!r} is not allowed; give {allowed}"


@contextmanager
def naming(input_name):
    """Put an input's name before the sentence of an error raised within, where it does not stand there already."""
    try:
        yield
    except GagelineError as error:
        if input_name in str(error):
            raise
        raise type(error)(f"{input_name}: {error}") from None


def _choices(annotation):
    if get_origin(annotation) is Literal:
        return get_args(annotation)
    return tuple(choice for part in get_args(annotation) for choice in _choices(part))
