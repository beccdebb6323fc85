import 'server-only';

/**
 * What people who guess try first: words, names and sayings that passwords are made of, with the trade's own words
 * and the demo season's published password. Collected for this product; brands and
 * real people are left out, a sentence of one's own is asked for anyway. One of them in a password does no harm; a
 * password made of nothing else is refused.
 */
const LIST = `
password passwort passphrase passcode passwd pass word secret secrets secure security letmein letme openup
opensesame sesame welcome welcomeback hello hallo hola bonjour goodbye howdy greetings thankyou please sorry login
logon signin signup account access enter entry unlock locked admin administrator root superuser user username guest
default changeme changeit change temporary temp testing tester test demo example sample training trial system
server master manager boss owner office work working company business team member members group staff crew people
person computer laptop desktop internet network website online offline mobile phone telephone tablet keyboard mouse
monkey dragon tiger lion eagle falcon panther bear wolf shark horse pony kitten kitty puppy doggy rabbit bunny
turtle chicken duck goose hawk raven spider snake butterfly ladybug honeybee bumblebee bee bees wasp wasps hornet
hornets insect insects football soccer baseball basketball hockey tennis golf rugby cricket volleyball swimming
running racing fishing hunting cycling united madrid eagles mario princess prince queen king angel angels devil
heaven hell god jesus christ bible church faith blessed blessing iloveyou iloveu ilove love lover lovers loveme
lovely forever always never together sweetheart darling honey baby babygirl babyboy sunshine sunflower sunset
sunrise rainbow moonlight starlight summer winter spring autumn weather thunder lightning snow rain cloud january
february march april may june july august september october november december monday tuesday wednesday thursday
friday saturday sunday morning evening midnight holiday birthday christmas easter halloween newyear today tomorrow
yesterday flower flowers rose lily daisy violet orchid garden forest mountain river ocean beach island valley
desert meadow orange banana cherry strawberry blueberry lemon peach mango grapes tomato potato cookie chocolate
candy sugar coffee cheese pizza red blue green yellow purple black white silver golden gold pink brown grey gray
one two three four five six seven eight nine ten zero hundred thousand million first second third last michael
jennifer jessica michelle ashley amanda daniel matthew joshua andrew william robert thomas charlie george oliver
jack harry james david john johnny mary maria anna emma sarah laura nicole samantha elizabeth victoria alexander
nicholas christopher jordan justin brandon taylor morgan hunter tyler austin jackson maggie ginger pepper buster
bailey shadow lucky rocky america canada england london paris berlin newyork california texas florida chicago
boston australia germany france spain italy family mother father mommy mummy daddy brother sister grandma grandpa
friend friends bestfriend children kids house home money dollar rich power powerful freedom peace victory winner
champion success happy happiness smile laugh dream dreams dreamer music guitar piano drummer singer rockstar disco
dance dancer mustang nothing something anything everything nobody somebody whatever whocares idontknow iforgot
forgot forgotten remember remembered correct battery staple correcthorsebatterystaple trustno trustnoone whoami
itsme thisismypassword mypassword yourpassword notapassword nopassword mynameis abcabc asdasd qweqwe zxczxc qwe asd
zxc aaa blah foobar foo bar baz thequickbrownfox jumpsoverthelazydog quick lazy maytheforcebewithyou mayforce
livelonglprosper tobeornottobe onceuponatime happybirthday merrychristmas goodmorning goodnight iamthebest
numberone letmeinplease openthedoor inthebeginning amazinggrace hallelujah hakunamatata supercalifragilistic
expialidocious twinkletwinkle littlestar polistes polister paperwasp paper nest nests comb combs cell cells brood
larva larvae egg eggs capped queenwasp colony foundress vespula vespid relocation relocate relocated technician
reviewer biologist coordinator researcher reading readings visit visits species native field lab laboratory science
research biology nature wildlife conservation county trust circle programme program sevenquietladders quiet ladders
ladder
`;

/** The words of the list, lower case, letters only. */
export const COMMON_WORDS: readonly string[] = LIST.trim().split(/\s+/);
