# The tally of an imported log in awk: for each bit of each bank how often it read 1 for 0 and 0 for 1, failing alone,
# was right by what was written, its different failing words, rows and columns, and its first and last line.
# Pairs of written and read are counted whole and taken apart at the end, which is the fastest way.
BEGIN {
  for (i = 0; i < 256; i++) hex[i] = sprintf("%02X", i)
  for (i = 0; i < 256; i++)
    for (b = 0; b < 8; b++) bit[hex[i], b] = int(i / 2 ^ b) % 2
  for (i = 0; i < 256; i++)
    for (j = 0; j < 256; j++) {
      list = ""
      for (b = 0; b < 8; b++) if (bit[hex[i], b] != bit[hex[j], b]) list = list b
      fails[hex[i], hex[j]] = list
    }
}
$2 != "W" || $4 != "R" || NF != 5 { unread++; next }
{
  bank = substr($1, 1, 1)
  pairs[bank, $3, $5]++
  if ($3 != $5) {
    list = fails[$3, $5]
    for (n = 1; n <= length(list); n++) {
      lane = bank " " substr(list, n, 1)
      if (!(lane in first)) first[lane] = NR
      last[lane] = NR
      seen[lane, $1] = 1
    }
  }
}
END {
  for (key in pairs) {
    split(key, part, SUBSEP)
    list = fails[part[2], part[3]]
    for (b = 0; b < 8; b++) {
      lane = part[1] " " b
      if (bit[part[2], b] == bit[part[3], b]) {
        if (bit[part[2], b]) ones[lane] += pairs[key]; else zeros[lane] += pairs[key]
      } else {
        if (bit[part[3], b]) one[lane] += pairs[key]; else zero[lane] += pairs[key]
        if (length(list) == 1) alone[lane] += pairs[key]
      }
    }
  }
  for (key in seen) {
    split(key, part, SUBSEP)
    words[part[1]]++
    if (!((part[1], substr(part[2], 4, 2)) in row)) { row[part[1], substr(part[2], 4, 2)] = 1; rows[part[1]]++ }
    if (!((part[1], substr(part[2], 2, 2)) in column)) { column[part[1], substr(part[2], 2, 2)] = 1; columns[part[1]]++ }
  }
  for (lane in first)
    print lane, one[lane] + 0, zero[lane] + 0, alone[lane] + 0, words[lane], rows[lane], columns[lane], first[lane], last[lane], zeros[lane] + 0, ones[lane] + 0
}
