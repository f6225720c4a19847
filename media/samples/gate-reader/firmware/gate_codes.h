/*
 * Codes of the tunable parts by channel. Written by Ohmward from a match description:
 * what is changed by hand here is lost.
 *
 * ohmward-table 1 bdedc51c8726f965
 * ohmward-description 4d0c0c9acebcb521
 */
#ifndef GATE_CODES_H
#define GATE_CODES_H

#include <stdint.h>

struct gate_codes_row {
    uint32_t frequency_hz; /* the channel, Hz; increasing */
    uint8_t antcap; /* code of "antcap" */
    uint8_t bank; /* code of "bank" */
};

#define GATE_CODES_COUNT 50

static const struct gate_codes_row gate_codes[GATE_CODES_COUNT] = {
    { 902750000ul, 16u, 1u },
    { 903250000ul, 15u, 1u },
    { 903750000ul, 15u, 1u },
    { 904250000ul, 15u, 1u },
    { 904750000ul, 15u, 1u },
    { 905250000ul, 14u, 1u },
    { 905750000ul, 14u, 1u },
    { 906250000ul, 14u, 1u },
    { 906750000ul, 13u, 1u },
    { 907250000ul, 13u, 1u },
    { 907750000ul, 13u, 1u },
    { 908250000ul, 13u, 1u },
    { 908750000ul, 13u, 1u },
    { 909250000ul, 12u, 1u },
    { 909750000ul, 12u, 1u },
    { 910250000ul, 12u, 1u },
    { 910750000ul, 12u, 1u },
    { 911250000ul, 11u, 1u },
    { 911750000ul, 11u, 1u },
    { 912250000ul, 11u, 1u },
    { 912750000ul, 11u, 1u },
    { 913250000ul, 11u, 1u },
    { 913750000ul, 10u, 1u },
    { 914250000ul, 10u, 1u },
    { 914750000ul, 10u, 1u },
    { 915250000ul, 10u, 1u },
    { 915750000ul, 11u, 0u },
    { 916250000ul, 9u, 1u },
    { 916750000ul, 9u, 1u },
    { 917250000ul, 9u, 1u },
    { 917750000ul, 10u, 0u },
    { 918250000ul, 10u, 0u },
    { 918750000ul, 10u, 0u },
    { 919250000ul, 9u, 0u },
    { 919750000ul, 9u, 0u },
    { 920250000ul, 9u, 0u },
    { 920750000ul, 9u, 0u },
    { 921250000ul, 9u, 0u },
    { 921750000ul, 9u, 0u },
    { 922250000ul, 8u, 0u },
    { 922750000ul, 8u, 0u },
    { 923250000ul, 8u, 0u },
    { 923750000ul, 8u, 0u },
    { 924250000ul, 8u, 0u },
    { 924750000ul, 7u, 0u },
    { 925250000ul, 7u, 0u },
    { 925750000ul, 7u, 0u },
    { 926250000ul, 7u, 0u },
    { 926750000ul, 7u, 0u },
    { 927250000ul, 7u, 0u },
};

#endif
