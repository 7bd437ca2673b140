/**
 * What people choose most, and what is tried first: small letters and digits only, as `passwordProblem` reduces what was typed.
 * Common knowledge, written from memory; no published list was copied. With 15 characters asked for, the short ones matter as the parts
 * of which longer bad ones are made ("passwordpassword", "qwerty123456789").
 */
export const COMMON_PASSWORDS: readonly string[] = `
123 1234 12345 123456 1234567 12345678 123456789 1234567890 0987654321 987654321 87654321 654321 54321 4321 321
111 1111 11111 111111 000 0000 00000 000000 123123 112233 121212 1q2w3e4r 1q2w3e4r5t 1q2w3e 1qaz2wsx 1qaz 2wsx 3edc q1w2e3r4 zaq12wsx
abc abcd abcde abcdef abcdefg abcdefgh abcdefghijklmnopqrstuvwxyz abc123 a1b2c3 a1b2c3d4 123abc
qwe qwer qwert qwerty qwertyui qwertyuiop qwertz qwertzuiop azerty azertyuiop asd asdf asdfgh asdfghjkl yxcvbnm zxc zxcv zxcvbn zxcvbnm
password passwort passw0rd p4ssw0rd pa55word password1 password12 password123 pass passphrase passcode mypassword mypass
letmein letme let me in welcome welcome1 hello hallo hi admin administrator root user guest test testing tester login logon signin
changeme change changeit default secret topsecret private access master trustno1 iloveyou ilove loveyou love you
monkey dragon sunshine princess football baseball basketball superman batman pokemon shadow michael jordan charlie killer freedom
whatever nothing computer internet google facebook samsung iphone android windows microsoft
summer winter spring autumn january february march april june july august september october november december
monday tuesday wednesday thursday friday saturday sunday 2020 2021 2022 2023 2024 2025 2026 2027 2028
correcthorsebatterystaple thequickbrownfox thequickbrownfoxjumpsoverthelazydog opensesame nevergonnagiveyouup maytheforcebewithyou
workshop garage mechanic apprentice mentor assessor college witnessline witness line paint bolt
`
  .split(/\s+/)
  .filter(Boolean);
